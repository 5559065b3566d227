import type { TrendSeries } from '@slighthill/shared/contracts/trend';
import { snap } from '@slighthill/shared/format';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { formatAmount } from './format-measure';
import type { TrendView } from './trend-view';

export interface DifferenceBracket {
  from: number;
  to: number;
  /** "0.10 L each way". */
  size: string;
}

/**
 * The important difference on both sides of the baseline, in the view's scale. In percent predicted it is the raw
 * difference as a share of the baseline's predicted value; a z-score has no fixed length for it.
 */
export const differenceBracket = (series: TrendSeries, view: TrendView): DifferenceBracket | null => {
  const { baseline, measure } = series;
  if (!baseline || view === 'z' || !isMeasureId(measure)) return null;
  const difference = getMeasure(measure).importantDifference;
  if (!difference) return null;
  const size = `${formatAmount(measure, difference.value, series.unit)} each way`;
  if (view === 'value')
    return { from: snap(baseline.value - difference.value), to: snap(baseline.value + difference.value), size };
  if (baseline.predicted === null || baseline.percentPredicted === null) return null;
  const points = (100 * difference.value) / baseline.predicted;
  return { from: baseline.percentPredicted - points, to: baseline.percentPredicted + points, size };
};
