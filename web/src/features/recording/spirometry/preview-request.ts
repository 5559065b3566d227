import { daysBetween } from '@slighthill/shared/calendar';
import type { CurrentUser } from '@slighthill/shared/contracts/auth';
import type { Patient } from '@slighthill/shared/contracts/patient';
import type { PredictionBody } from '@slighthill/shared/contracts/prediction';
import type { BronchodilatorState } from '@slighthill/shared/contracts/spirometry-test';
import type { BestPreview } from './best-preview';

/** Decimal age at the test (rule 0.5). */
export const ageYearsAt = (birthDate: string, on: string): number => daysBetween(birthDate, on) / 365.25;

export interface PreviewPerson {
  patient: Pick<Patient, 'birthDate' | 'sexForPrediction' | 'diagnosisGroup' | 'diagnosisConfirmed'>;
  clinic: Pick<CurrentUser['clinic'], 'ratioRule' | 'fev1SeverityRule'>;
  on: string;
  heightCm: number | null;
}

/** What the live preview asks the server, or null while there is nothing to ask. */
export const previewRequest = (
  { patient, clinic, on, heightCm }: PreviewPerson,
  best: BestPreview,
  state: BronchodilatorState,
): PredictionBody | null => {
  const ageYears = ageYearsAt(patient.birthDate, on);
  if (heightCm === null || !(ageYears >= 18 && ageYears <= 100)) return null;
  if (best.fev1 === null && best.fvc === null) return null;
  return {
    referenceSet: 'gli-global-2022',
    sex: patient.sexForPrediction,
    ageYears,
    heightCm,
    bronchodilator: state,
    diagnosisGroup: patient.diagnosisGroup,
    diagnosisConfirmed: patient.diagnosisConfirmed,
    ratioRule: clinic.ratioRule,
    gradingRule: clinic.fev1SeverityRule,
    values: {
      ...(best.fev1 === null ? {} : { fev1: best.fev1 }),
      ...(best.fvc === null ? {} : { fvc: best.fvc }),
    },
  };
};
