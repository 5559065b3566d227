import type { TrendBand, TrendPattern, TrendResponse } from '@slighthill/shared/contracts/trend';
import { edgesOf, formatPercentPredicted, formatZ } from '@slighthill/shared/format';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { limitWords } from '../../charts/band-strips';
import { gradingRuleLabel, referenceSetLabel, stateWords } from '../../charts/rule-words';
import { formatDate } from '../../lib/clinic-time';
import { referenceGroupLabel } from '../../lib/rule-words';
import type { TrendRules } from './queries';

type Pattern = NonNullable<TrendPattern>;

/** Words and the numbers that stand out in them. */
export type Phrase = string | { strong: string };

const fixedRatio = 0.7;
const restrictive = ['restriction', 'mixed'];

const bandsOf = (trends: TrendResponse, measure: string): TrendBand[] =>
  trends.series.find((series) => series.measure === measure)?.bands ?? [];

/** A ratio has two decimals, more only where two would print it like a limit it is not at (rule 0.4). */
const ratioWords = (ratio: number, lln: number | null): string =>
  formatZ(ratio, [{ at: fixedRatio }, ...(lln === null ? [] : [{ at: lln }])]);

const ratioSentence = ({ values, lowByFixedRatio, lowByLln }: Pattern): Phrase[] => {
  if (values.ratio === null) return [];
  const fixed = lowByFixedRatio ? 'below 0.70' : 'not below 0.70';
  const lln = values.ratioLln === null ? '' : `, ${formatZ(values.ratioLln, [])}`;
  const second =
    lowByLln === null
      ? ''
      : lowByFixedRatio === lowByLln
        ? `${lowByLln ? ' and' : ' and not'} below the LLN${lln}`
        : ` but ${lowByLln ? '' : 'not '}below the LLN${lln}`;
  return ['FEV1/FVC ', { strong: ratioWords(values.ratio, values.ratioLln) }, ` is ${fixed}${second}. `];
};

const percentPhrase = (trends: TrendResponse, measure: string, percent: number): Phrase => {
  const bands = bandsOf(trends, measure).filter((band) => band.quantity === 'percent-predicted');
  return { strong: formatPercentPredicted(percent, edgesOf(bands)) };
};

/** The numbers the pattern rests on, as the API gave them. */
export const numbersSentence = (pattern: Pattern, trends: TrendResponse): Phrase[] => {
  const { fev1PercentPredicted: fev1, tlcPercentPredicted: tlc } = pattern.values;
  const conclusion = restrictive.includes(pattern.id)
    ? ', below the LLN, so there is restriction.'
    : ', so no restriction.';
  return [
    ...ratioSentence(pattern),
    ...(fev1 === null ? [] : ['FEV1 is ', percentPhrase(trends, 'fev1', fev1), ' of predicted. ']),
    ...(tlc === null ? [] : ['TLC is ', percentPhrase(trends, 'tlc', tlc), conclusion]),
  ];
};

const quantityWords = { 'percent-predicted': ' % predicted', z: ' z-score', value: '' } as const;

const severitySentence = ({ severity }: Pattern, trends: TrendResponse): string => {
  if (!severity) return '';
  const bands = bandsOf(trends, severity.measure);
  const band = bands.find((candidate) => candidate.id === severity.bandId);
  const name = isMeasureId(severity.measure) ? getMeasure(severity.measure).shortLabel : severity.measure;
  const by = `Severity by ${gradingRuleLabel(severity.rule)}`;
  if (!band) return `${by}, ${severity.label}.`;
  const limits = limitWords(
    band,
    bands.some((other) => other.to === band.from && other.toInclusive === true),
  );
  return `${by}, ${name}${quantityWords[band.quantity]}, ${severity.label} is ${limits}.`;
};

/** A legacy set is always named with the group it was looked at with. */
const setWords = (referenceSet: string, asked: TrendRules): string => {
  const group = asked.referenceSet === referenceSet ? asked.group : null;
  return `${referenceSetLabel(referenceSet)}${group === null ? '' : `, group ${referenceGroupLabel(group)}`}`;
};

/** Which rules, which test and which equations produced the pattern. */
export const rulesSentence = (pattern: Pattern, trends: TrendResponse, asked: TrendRules): string => {
  const { ratioRule, lowByFixedRatio, lowByLln, values } = pattern;
  const [own, other] = ratioRule === 'lln' ? ['LLN', 'fixed ratio 0.70'] : ['fixed ratio 0.70', 'LLN'];
  const agreement =
    lowByLln === null || lowByFixedRatio === null
      ? ''
      : `, ${other} ${lowByFixedRatio === lowByLln ? 'agrees' : 'does not agree'}`;
  const test = `Test of ${formatDate(values.takenOn)}, ${stateWords[values.state]}, ${setWords(values.referenceSet, asked)}.`;
  return [`Pattern by ${own}${agreement}.`, severitySentence(pattern, trends), test, ...pattern.notes]
    .filter((sentence) => sentence !== '')
    .join(' ');
};
