import type { TrendPoint, TrendSeries } from '@slighthill/shared/contracts/trend';
import { dayNumber } from '@slighthill/shared/calendar';
import { formatNumber } from '@slighthill/shared/format';
import { formatValue } from './format-measure';
import type { TrendView } from './trend-view';

export interface LlnLine {
  /** One per day that has a lower limit, oldest first. */
  points: { day: number; value: number }[];
  /** The latest value: "LLN, 73". */
  label: string;
  /** Whether the first value reads the same, so that the label may stand at the left edge. */
  steady: boolean;
}

/** The lower limit is a raw value; the percent view only changes its scale. */
const llnInView = (point: TrendPoint, view: TrendView): number | null => {
  if (point.lln === null) return null;
  if (view === 'value') return point.lln;
  if (view === 'z') return -1.645;
  return point.predicted === null ? null : (100 * point.lln) / point.predicted;
};

export const llnLine = (series: TrendSeries, view: TrendView): LlnLine | null => {
  const points = series.points.flatMap((point) => {
    const value = llnInView(point, view);
    return value === null ? [] : [{ day: dayNumber(point.takenOn), value }];
  });
  const [first, last] = [points[0], points.at(-1)];
  if (!first || !last) return null;
  const write = (value: number): string =>
    view === 'value' ? formatValue(series.measure, value) : formatNumber(value, view === 'z' ? 3 : 0);
  return { points, label: `LLN, ${write(last.value)}`, steady: write(first.value) === write(last.value) };
};
