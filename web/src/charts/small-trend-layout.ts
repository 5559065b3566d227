import type { TrendSeries } from '@slighthill/shared/contracts/trend';
import { dayNumber } from '@slighthill/shared/calendar';
import { scaleLinear } from '@visx/scale';

export interface SmallTrendLayout {
  points: { x: number; y: number }[];
  baselineY: number;
  /** What is too small to count, each way of the baseline. */
  zone: { y: number; height: number } | null;
}

/** Comparable points from the baseline on, with one important difference each way always in sight. */
export const smallTrendLayout = (
  series: TrendSeries,
  size: { width: number; height: number },
): SmallTrendLayout | null => {
  const { baseline, zone } = series;
  if (!baseline) return null;
  const shown = series.points.filter((point) => point.compared && point.takenAt >= baseline.takenAt);
  const values = [...shown.map((point) => point.value), baseline.value];
  const half = zone ?? Math.abs(baseline.value) * 0.15;
  const from = Math.min(...values, baseline.value - half);
  const to = Math.max(...values, baseline.value + half);
  const days = shown.map((point) => dayNumber(point.takenOn));
  const first = dayNumber(baseline.takenOn);
  const edge = Math.min(8, size.height / 6);
  const x = scaleLinear<number>({
    domain: [first, Math.max(...days, first + 1)],
    range: [size.width * 0.15, size.width * 0.84],
  });
  const y = scaleLinear<number>({ domain: [from, to || from + 1], range: [size.height - edge, edge] });
  return {
    points: shown.map((point) => ({ x: x(dayNumber(point.takenOn)), y: y(point.value) })),
    baselineY: y(baseline.value),
    zone:
      zone === null
        ? null
        : { y: y(baseline.value + zone), height: y(baseline.value - zone) - y(baseline.value + zone) },
  };
};
