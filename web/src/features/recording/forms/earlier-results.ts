import type { Patient } from '@slighthill/shared/contracts/patient';
import type { TestListItem } from '@slighthill/shared/contracts/measurement';
import type { MeasureId } from '@slighthill/shared/measures';
import type { Earlier } from './number-questions';

type BodySize = Pick<Patient, 'bodySize'>['bodySize'];

/** The patient's newest result of a measure that stands; `exceptId` leaves out the test being amended. */
export const lastResult = (
  tests: readonly TestListItem[],
  measure: MeasureId,
  exceptId: string | null = null,
): Earlier | null => {
  const found = tests.find((test) => !test.voided && test.id !== exceptId && test.values[measure] !== undefined);
  const value = found?.values[measure];
  return found && value !== undefined ? { value, on: found.on } : null;
};

export const lastHeight = (bodySize: BodySize): Earlier | null =>
  bodySize?.heightCm && bodySize.heightOn ? { value: bodySize.heightCm, on: bodySize.heightOn } : null;

export const lastWeight = (bodySize: BodySize): Earlier | null =>
  bodySize?.weightKg && bodySize.weightOn ? { value: bodySize.weightKg, on: bodySize.weightOn } : null;
