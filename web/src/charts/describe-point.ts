import type { TrendPoint, TrendSeries } from '@slighthill/shared/contracts/trend';
import { formatNumber, formatZ } from '@slighthill/shared/format';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { formatDate } from '../lib/clinic-time';
import { limitWords } from './band-strips';
import { formatInView, formatResult } from './format-measure';
import { capitalize, referenceSetLabel, stateWords } from './rule-words';

export interface PointDescription {
  date: string;
  role: 'Baseline' | 'Latest' | null;
  figures: { value: string; label: string }[];
  details: string;
  /** All of it as one announcement. */
  spoken: string;
}

const shortLabel = (series: TrendSeries): string =>
  isMeasureId(series.measure) ? getMeasure(series.measure).shortLabel : series.measure;

const isRatio = (series: TrendSeries): boolean =>
  isMeasureId(series.measure) && getMeasure(series.measure).unit.ucum === '1';

const figuresOf = (series: TrendSeries, point: TrendPoint): PointDescription['figures'] => {
  const { measure, unit, bands } = series;
  const figures = [{ value: formatResult(measure, point.value, unit), label: shortLabel(series) }];
  if (point.percentPredicted !== null && point.predicted !== null && !isRatio(series)) {
    const value = formatInView(measure, point.percentPredicted, 'percent-predicted', unit, bands);
    figures.push({ value, label: `of ${formatResult(measure, point.predicted, unit)}` });
  }
  if (point.z !== null) figures.push({ value: formatZ(point.z), label: 'z-score' });
  else if (point.zApproximate != null)
    figures.push({ value: formatZ(point.zApproximate), label: 'z-score, approximate' });
  return figures;
};

const stateSentence = (series: TrendSeries, point: TrendPoint): string | null => {
  const graded = isMeasureId(series.measure) && getMeasure(series.measure).hasQuality;
  const quality = !graded ? null : point.quality === null ? 'quality not graded' : `grade ${point.quality}`;
  const words = [point.state && stateWords[point.state], quality].filter((word) => word !== null);
  return words.length === 0 ? null : capitalize(`${words.join(', ')}.`);
};

const bandSentence = (series: TrendSeries, point: TrendPoint): string | null => {
  const band = series.bands.find((candidate) => candidate.id === point.band);
  if (!band || !point.graded) return null;
  const startsAbove = series.bands.some((other) => other.to === band.from && other.toInclusive === true);
  return `${capitalize(point.bandLabel ?? band.label)}, ${limitWords(band, startsAbove)}.`;
};

const setSentence = (series: TrendSeries, point: TrendPoint): string | null => {
  if (point.predicted === null || series.referenceSet === null) return null;
  const height = point.heightCm === null ? '' : `, ${formatNumber(point.heightCm, 1)} cm`;
  const method = point.heightCarried
    ? ' carried over'
    : point.heightMethod === 'stated' || point.heightMethod === 'arm-span'
      ? point.heightMethod === 'stated'
        ? ' as stated'
        : ' from arm span'
      : '';
  return `${referenceSetLabel(series.referenceSet)} at age ${formatNumber(point.ageYears, 1)}${height}${method}.`;
};

/** What was the case during the test, where it was said and is not the registry's default. */
const conditionSentence = (series: TrendSeries, point: TrendPoint): string | null => {
  if (!isMeasureId(series.measure)) return null;
  const declared = Object.entries(getMeasure(series.measure).conditions);
  const words = declared.flatMap(([key, condition]) => {
    const value = point.conditions?.[key];
    if (value === undefined || value === null || value === condition.default) return [];
    const choice = condition.choices?.indexOf(String(value)) ?? -1;
    const text =
      condition.choiceLabels?.[choice]?.toLowerCase() ??
      (value === true ? 'yes' : value === false ? 'no' : String(value));
    return [`${condition.label.toLowerCase()} ${text}${condition.unit ? ` ${condition.unit}` : ''}`];
  });
  return words.length === 0 ? null : capitalize(`${words.join(', ')}.`);
};

const asSentence = (text: string): string => `${capitalize(text.replace(/\.$/, ''))}.`;

/** Everything known about one point, as the reader's card and its announcement say it. */
export const describePoint = (series: TrendSeries, point: TrendPoint): PointDescription => {
  const lln = point.lln === null ? null : `LLN ${formatResult(series.measure, point.lln, series.unit)}.`;
  const details = [
    stateSentence(series, point),
    lln,
    bandSentence(series, point),
    setSentence(series, point),
    conditionSentence(series, point),
    point.reason === undefined ? null : asSentence(point.reason),
  ]
    .filter((sentence) => sentence !== null)
    .join(' ');
  const date = formatDate(point.takenOn);
  const role = point.role === 'baseline' ? 'Baseline' : point.role === 'latest' ? 'Latest' : null;
  const figures = figuresOf(series, point);
  const numbers = figures.map(({ value, label }) =>
    label.startsWith('of ') ? `${value} ${label}` : `${label} ${value}`,
  );
  const spoken = [role ? `${date}, ${role.toLowerCase()}.` : `${date}.`, `${numbers.join(', ')}.`, details]
    .join(' ')
    .trim();
  return { date, role, figures, details, spoken };
};
