import type { Patient } from '@slighthill/shared/contracts/patient';
import { diagnosisGroupLabels } from '@slighthill/shared/vocabulary';

/** Whose record a drawer writes to: "Ruth Valdane, 65, COPD". */
export const patientWords = (
  patient: Pick<Patient, 'givenName' | 'familyName' | 'ageYears' | 'diagnosisGroup'>,
): string =>
  `${patient.givenName} ${patient.familyName}, ${patient.ageYears}, ${diagnosisGroupLabels[patient.diagnosisGroup]}`;
