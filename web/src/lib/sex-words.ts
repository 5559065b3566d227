import type { SexForPrediction } from '@slighthill/shared/contracts/patient';

/** The sex an equation is computed for, in the words of forms and records. */
export const sexWords: Record<SexForPrediction, string> = { female: 'Female', male: 'Male' };
