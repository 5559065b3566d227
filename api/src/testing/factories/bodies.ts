import { randomUUID } from 'node:crypto';

/** Request bodies that are right as they stand; tests change what they are about. */
export const spirometryBody = (changes: object = {}) => ({
  performedAt: '2026-06-10T15:00:00Z',
  heightCm: 174.5,
  bronchodilator: 'after',
  best: { fev1: 1.32, fvc: 2.78 },
  ...changes,
});

export const walkBody = (value: number, takenAt = '2026-06-10T15:30:00Z') => ({
  measure: 'sixMinuteWalkDistance',
  takenAt,
  value,
});

export const patientBody = (changes: object = {}) => ({
  givenName: 'Leland',
  familyName: `Brask ${randomUUID().slice(0, 8)}`,
  birthDate: '1959-03-02',
  sexForPrediction: 'male',
  diagnosisGroup: 'copd',
  ...changes,
});
