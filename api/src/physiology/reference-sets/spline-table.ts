import type { MeasureId } from '@slighthill/shared/measures';
import type { Sex } from './types';

/** Published age terms by measure and sex, one number per quarter year from 18.0 years. A missing term is zero. */
export type SplineTable = Partial<
  Record<MeasureId, Record<Sex, { m?: readonly number[]; s?: readonly number[]; l?: readonly number[] }>>
>;

const firstAgeYears = 18;
const stepsPerYear = 4;

/**
 * Value of an age term by linear interpolation between its quarter-year rows (rule PV-2), e.g. 63.37 years lies
 * between 63.25 and 63.50 with weight 0.48. A set without the term gives 0. Age 18 to the last row, which the set's
 * own age limits guarantee.
 */
export function splineAt(rows: readonly number[] | undefined, ageYears: number): number {
  if (!rows) return 0;
  const position = (ageYears - firstAgeYears) * stepsPerYear;
  const index = Math.floor(position);
  const low = rows[index];
  if (low === undefined) throw new RangeError(`ageYears ${ageYears} is outside the table`);
  const weight = position - index;
  if (weight === 0) return low;
  const high = rows[index + 1];
  if (high === undefined) throw new RangeError(`ageYears ${ageYears} is outside the table`);
  return low + weight * (high - low);
}
