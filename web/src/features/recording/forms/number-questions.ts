import { formatNumber, snap } from '@slighthill/shared/format';
import { checkValue, getMeasure, heightLimitsCm, questionHeight, type MeasureId } from '@slighthill/shared/measures';
import { formatDayMonth } from '../../../lib/clinic-time';
import { parseDecimal } from '../../../lib/parse-decimal';
import type { FormQuestion } from './form-question';

/** An earlier result the typed one is held against. */
export interface Earlier {
  value: number;
  on: string;
}

/** Heights measured this far apart are asked about (rule 0.6, set by this product). */
const heightChangeCm = 1.5;

export const typed = (text: string): number | null => {
  const value = parseDecimal(text);
  return value === null || Number.isNaN(value) ? null : value;
};

const shown = (id: MeasureId, value: number): string => {
  const { decimals, unit } = getMeasure(id);
  return `${formatNumber(value, decimals)}${unit.symbol === '%' ? '%' : unit.symbol && ` ${unit.symbol}`}`;
};

/** Rule 0.7: outside the usual range a value is asked about. */
export const plausibleQuestion = (id: MeasureId, text: string, field: string, name: string): FormQuestion | null => {
  const value = typed(text);
  const found = value === null ? null : checkValue(id, value);
  if (!found || !('question' in found)) return null;
  return { key: `${field}:usual:${value}`, field, text: `${name}: ${found.question}`, mayStand: true };
};

/** Rule 0.7: a value far from the last one is asked about. The limit comes from the measure's registry entry. */
export const changeQuestion = (
  id: MeasureId,
  value: number | null,
  earlier: Earlier | null,
  field: string,
  name: string,
): FormQuestion | null => {
  const limit = getMeasure(id).relativeChangeQuestion;
  if (!limit || value === null || !earlier || earlier.value <= 0) return null;
  const percent = snap((100 * (value - earlier.value)) / earlier.value);
  if (Math.abs(percent) <= limit.percent) return null;
  const text = `${name} ${shown(id, value)} is ${formatNumber(Math.abs(percent), 0)}% ${percent < 0 ? 'below' : 'above'} the last, ${shown(id, earlier.value)} on ${formatDayMonth(earlier.on)}. Is it right?`;
  return { key: `${field}:change:${value}`, field, text, mayStand: true };
};

const inLimits = (cm: number): boolean => cm >= heightLimitsCm.min && cm <= heightLimitsCm.max;

/** The height a preview may use: the typed one when it is a height in cm. */
export const usableHeightCm = (text: string): number | null => {
  const value = typed(text);
  return value !== null && inLimits(value) ? value : null;
};

/** Rule 0.6: inches and meters typed as cm are named, never converted; a height that moved is asked about. */
export const heightQuestion = (text: string, earlier: Earlier | null, field = 'heightCm'): FormQuestion | null => {
  const value = typed(text);
  if (value === null) return null;
  const unit = questionHeight(value);
  if (unit) {
    const cm = unit.suggestionCm.toFixed(1);
    return {
      key: `${field}:unit:${value}`,
      field,
      text: unit.question,
      fix: { label: `Yes, ${cm} cm`, value: cm },
      mayStand: false,
    };
  }
  // Compared as they are shown, so that 166.5 against 165.0 is not more than 1.5 by a trick of binary arithmetic.
  if (!earlier || !inLimits(value) || Math.round(Math.abs(value - earlier.value) * 10) <= heightChangeCm * 10)
    return null;
  return {
    key: `${field}:change:${value}`,
    field,
    text: `${formatNumber(value, 1)} cm. It was ${formatNumber(earlier.value, 1)} cm on ${formatDayMonth(earlier.on)}. Is it right?`,
    mayStand: true,
  };
};

/** Weight: outside the usual range, or more than a tenth from the last (rule 0.7). */
export const weightQuestion = (text: string, earlier: Earlier | null, field = 'weightKg'): FormQuestion | null =>
  plausibleQuestion('weight', text, field, 'Weight') ?? changeQuestion('weight', typed(text), earlier, field, 'Weight');
