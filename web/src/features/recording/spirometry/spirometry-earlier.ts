import type { TestListItem } from '@slighthill/shared/contracts/measurement';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { lastHeight, lastResult, lastWeight } from '../forms/earlier-results';
import type { SpirometryEarlier } from './spirometry-questions';

/** What a new or amended test is held against. */
export const spirometryEarlier = (
  patient: Pick<Patient, 'bodySize'>,
  tests: readonly TestListItem[],
  exceptId: string | null = null,
): SpirometryEarlier => ({
  heightCm: lastHeight(patient.bodySize),
  weightKg: lastWeight(patient.bodySize),
  fev1: lastResult(tests, 'fev1', exceptId),
  fvc: lastResult(tests, 'fvc', exceptId),
});
