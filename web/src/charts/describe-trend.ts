import type { TrendPoint, TrendSeries } from '@slighthill/shared/contracts/trend';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { formatDate } from '../lib/clinic-time';
import { formatInView, formatResult, unitInName } from './format-measure';
import { pointInView, type TrendView } from './trend-view';
import { changeWords, verdictWords } from './verdict-words';

const viewWords: Record<TrendView, string> = { 'percent-predicted': ', percent predicted', value: '', z: ', z-score' };

export const measureTitle = (series: TrendSeries, view: TrendView): string => {
  const measure = isMeasureId(series.measure) ? getMeasure(series.measure) : null;
  if (view !== 'value' || series.unit === '' || measure === null || unitInName(series.measure, series.unit))
    return `${measure?.label ?? series.measure}${viewWords[view]}`;
  const units: Record<string, string> = { L: 'liters', m: 'meters', '%': 'percent', s: 'seconds' };
  return `${measure.label}, ${units[series.unit] ?? series.unit}`;
};

const pointWords = (series: TrendSeries, point: TrendPoint, view: TrendView): string => {
  const value = pointInView(point, view);
  const raw = formatResult(series.measure, point.value, series.unit);
  const shown = value === null ? raw : formatInView(series.measure, value, view, series.unit, series.bands);
  return `${shown}${view === 'value' || value === null ? '' : ` (${raw})`} on ${formatDate(point.takenOn)}`;
};

/** One sentence in place of the picture: baseline, latest, verdict. */
export const describeTrend = (series: TrendSeries, view: TrendView): string => {
  const title = measureTitle(series, view);
  const { baseline, latest } = series;
  const first = series.points[0];
  if (!first) return `${title}: no results.`;
  if (!baseline || !latest) {
    const shown = baseline ?? series.points.at(-1) ?? first;
    return `${title}: ${pointWords(series, shown, view)}. ${verdictWords(series).words}.`;
  }
  const change = changeWords(series);
  return (
    `${title}: baseline ${pointWords(series, baseline, view)}, latest ${pointWords(series, latest, view)}. ` +
    `${verdictWords(series).words}${change ? `, ${change}` : ''}.`
  );
};
