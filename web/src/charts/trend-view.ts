import type { TrendBand, TrendPoint, TrendSeries } from '@slighthill/shared/contracts/trend';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';

/** The scale a trend is looked at: percent of predicted, the raw unit, or the z-score. */
export const trendViews = ['percent-predicted', 'value', 'z'] as const;
export type TrendView = (typeof trendViews)[number];

export const isTrendView = (text: string | null): text is TrendView =>
  text !== null && (trendViews as readonly string[]).includes(text);

export const pointInView = (point: TrendPoint, view: TrendView): number | null => {
  if (view === 'value') return point.value;
  return view === 'z' ? (point.z ?? point.zApproximate ?? null) : point.percentPredicted;
};

/** A ratio is never shown as a percent of its predicted value (rule 0.4). */
const isRatio = (series: TrendSeries): boolean =>
  isMeasureId(series.measure) && getMeasure(series.measure).unit.ucum === '1';

/** The views that have at least one number to draw. */
export const availableViews = (series: TrendSeries): TrendView[] =>
  trendViews.filter(
    (view) =>
      (view !== 'percent-predicted' || !isRatio(series)) &&
      series.points.some((point) => pointInView(point, view) !== null),
  );

/** The view a chart opens in: where its grading rule has its bands, else percent predicted for lung function. */
export const defaultView = (series: TrendSeries): TrendView => {
  const views = availableViews(series);
  const banded = series.bands[0]?.quantity;
  if (banded && views.includes(banded)) return banded;
  const kind = isMeasureId(series.measure) ? getMeasure(series.measure).referenceKind : null;
  if (kind !== null && kind !== 'walk' && views.includes('percent-predicted')) return 'percent-predicted';
  return 'value';
};

/**
 * The bands to color in this view. Bands of a measure with predictions are colored only while the patient's current
 * pattern is abnormal (rule GR-0); those of a score wherever the score was graded.
 */
export const bandsToDraw = (series: TrendSeries, view: TrendView, patternAbnormal: boolean): TrendBand[] => {
  const hasPrediction = isMeasureId(series.measure) && getMeasure(series.measure).referenceKind !== null;
  const wanted = hasPrediction ? patternAbnormal : series.points.some((point) => point.graded);
  return wanted ? series.bands.filter((band) => band.quantity === view) : [];
};
