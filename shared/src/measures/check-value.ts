import { formatNumber } from '../format';
import type { MeasureId } from './measure-ids';
import { getMeasure } from './all-measures';
import type { Measure, Range } from './types';

export type ValueCheck =
  { problem: 'absolute' | 'step' | 'not-a-number'; message: string } | { question: string } | null;

const inside = (value: number, range: Range): boolean => value >= range.min && value <= range.max;

/** Scores go without a unit: "must be 0 to 4", since the label says what is scored. */
const withUnit = (text: string, measure: Measure): string => {
  const symbol = measure.unit.ucum === '{score}' ? '' : measure.unit.symbol;
  if (symbol === '%') return `${text}%`;
  return symbol ? `${text} ${symbol}` : text;
};

const rangeWords = (range: Range, measure: Measure): string =>
  withUnit(`${formatNumber(range.min, measure.decimals)} to ${formatNumber(range.max, measure.decimals)}`, measure);

const isWholeStep = (value: number, step: number): boolean => Math.abs(value / step - Math.round(value / step)) < 1e-9;

function stepProblem(measure: Measure, value: number): string | null {
  if (measure.allowedValues && !measure.allowedValues.includes(value))
    return `${measure.label} is one of ${measure.allowedValues.join(', ')}`;
  if (measure.step === null || isWholeStep(value, measure.step)) return null;
  return measure.step === 1
    ? `${measure.label} must be a whole number`
    : `${measure.label} goes in ${withUnit(`steps of ${measure.step}`, measure)}`;
}

/**
 * Holds a value, in the measure's display unit, to its step and ranges (rules 0.7 and OM-0). A `problem` is refused by
 * form and API alike; a `question` is asked and never blocks; null is fine.
 */
export function checkValue(id: MeasureId, value: number): ValueCheck {
  const measure = getMeasure(id);
  if (!Number.isFinite(value)) return { problem: 'not-a-number', message: `${measure.label} must be a number` };
  if (measure.absolute && !inside(value, measure.absolute))
    return { problem: 'absolute', message: `${measure.label} must be ${rangeWords(measure.absolute, measure)}` };
  const step = stepProblem(measure, value);
  if (step) return { problem: 'step', message: step };
  if (measure.plausible && !inside(value, measure.plausible)) {
    const shown = withUnit(formatNumber(value, measure.decimals), measure);
    return { question: `${shown} is outside the usual ${rangeWords(measure.plausible, measure)}. Is it right?` };
  }
  return null;
}
