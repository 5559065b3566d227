import type { Flag, Patient } from '@slighthill/shared/contracts/patient';

const id = (number: number): string => `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`;

export const aFlag = (number: number, more: Partial<Flag> = {}): Flag => ({
  id: id(700 + number),
  rule: 'phq9-item9',
  label: 'PHQ-9 ninth answer',
  detail: 'The ninth answer was 1 on Oct 12, 2026. Speak with the patient today.',
  severity: 'safety',
  raisedAt: '2026-10-12T16:13:00.000Z',
  version: 1,
  sourceKind: 'measurement',
  sourceId: id(800 + number),
  ...more,
});

/** An invented man with COPD in the middle of his course; the trend fixture is his. */
export const aPatient = (more: Partial<Patient> = {}): Patient => ({
  id: id(100),
  givenName: 'Leland',
  familyName: 'Brask',
  birthDate: '1959-03-02',
  ageYears: 67,
  sexForPrediction: 'male',
  diagnosisGroup: 'copd',
  diagnosisConfirmed: true,
  recordNumber: 'AF-1042',
  email: 'leland@example.test',
  phone: '555-0133',
  version: 3,
  createdAt: '2026-02-20T16:00:00.000Z',
  enrollment: {
    id: id(3),
    programId: id(50),
    programName: 'Standard course',
    plannedSessions: 24,
    status: 'active',
    startOn: '2026-09-14',
    plannedEndOn: '2026-12-09',
    endedOn: null,
    consentOn: '2026-09-01',
    statusReason: null,
    version: 2,
  },
  oxygen: { restLpm: null, walkingLpm: 2, asleepLpm: null, device: 'Portable cylinder', on: '2026-08-31' },
  bodySize: {
    heightCm: 174.5,
    heightMethod: 'measured',
    heightOn: '2026-10-12',
    weightKg: 78.2,
    weightOn: '2026-10-12',
  },
  pattern: { id: 'obstruction', heading: 'Obstructive pattern, severe', provisional: false, takenOn: '2026-10-12' },
  openFlags: [aFlag(1)],
  openHolds: 0,
  counts: { tests: 7, file: 4 },
  abilities: ['edit', 'enroll', 'record', 'resolve-flag'],
  createdBy: { id: id(1), displayName: 'Mira Solberg' },
  ...more,
});
