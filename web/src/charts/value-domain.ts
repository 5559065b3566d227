import type { TrendBand, TrendSeries } from '@slighthill/shared/contracts/trend';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { differenceBracket } from './important-difference';
import { llnLine } from './lln-line';
import { niceTicks } from './nice-ticks';
import { pointInView, type TrendView } from './trend-view';

export interface ValueDomain {
  from: number;
  to: number;
  ticks: number[];
}

/** The limits between bands; the outer two of a list are open. */
export const bandLimits = (bands: readonly TrendBand[]): number[] =>
  [...new Set(bands.flatMap((band) => [band.from, band.to]))].filter((limit) => limit !== null).sort((a, b) => a - b);

const pad = { data: 0.08, limits: 0.36 };
const smallestSpan: Record<TrendView, number> = { 'percent-predicted': 20, value: 0, z: 2 };

/** Room for what is drawn, and for the outer two bands to hold their names. */
const bounds = (series: TrendSeries, view: TrendView, limits: number[]) => {
  const bracket = differenceBracket(series, view);
  const data = [
    ...series.points.map((point) => pointInView(point, view)).filter((value) => value !== null),
    ...(llnLine(series, view)?.points.map((point) => point.value) ?? []),
    ...(bracket ? [bracket.from, bracket.to] : []),
  ];
  const all = [...data, ...limits];
  const [low, high] = [Math.min(...all), Math.max(...all)];
  const span = Math.max(high - low, smallestSpan[view], Math.abs(high) * 0.1, 1e-6);
  const limitSpan = (limits.at(-1) ?? 0) - (limits[0] ?? 0) || span;
  const from = Math.min(Math.min(...data) - pad.data * span, ...limits.map((limit) => limit - pad.limits * limitSpan));
  const to = Math.max(Math.max(...data) + pad.data * span, ...limits.map((limit) => limit + pad.limits * limitSpan));
  return { from: low >= 0 ? Math.max(from, 0) : from, to };
};

/** The vertical range of a chart: from the registry's start where it has one, else as the data and bands ask. */
export const valueDomain = (series: TrendSeries, view: TrendView, bands: readonly TrendBand[]): ValueDomain => {
  const measure = isMeasureId(series.measure) ? getMeasure(series.measure) : null;
  const found = bounds(series, view, bandLimits(bands));
  const start = view === 'value' ? (measure?.axisFrom ?? null) : null;
  const lowest = Math.min(...series.points.map((point) => pointInView(point, view) ?? Infinity));
  const from = start === null ? found.from : Math.min(start, lowest);
  const smallestStep = view === 'value' ? 10 ** -(measure?.decimals ?? 2) : view === 'z' ? 0.1 : 1;
  const { ticks, to } = niceTicks(from, Math.max(found.to, from + smallestStep), smallestStep);
  return { from, to, ticks };
};
