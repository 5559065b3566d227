import type { CurrentUser } from '@slighthill/shared/contracts/auth';
import type { Patient, PatientListItem } from '@slighthill/shared/contracts/patient';

const id = (number: number): string => `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`;

export const coordinator: CurrentUser = {
  id: id(1),
  displayName: 'Mira Solberg',
  title: 'Coordinator',
  email: 'mira@clinic.test',
  clinic: {
    id: id(9),
    name: 'Alder Falls',
    timeZone: 'America/Denver',
    phone: '555-0142',
    ratioRule: 'fixed-ratio',
    fev1SeverityRule: 'ats-ers-2005',
    tlcSeverityRule: 'tlc-percent',
    tlcWindowDays: 365,
  },
  abilities: ['patients:read', 'patients:write', 'tests:read', 'tests:write'],
  areas: ['patients'],
  firstPath: '/patients',
  idleSeconds: 900,
  patientId: null,
};

export const reader: CurrentUser = {
  ...coordinator,
  id: id(2),
  displayName: 'Jo Ferris',
  abilities: ['patients:read'],
};

export const administrator: CurrentUser = {
  ...coordinator,
  id: id(3),
  displayName: 'Per Holm',
  title: 'Administrator',
  email: 'per@clinic.test',
  abilities: ['clinic:manage', 'users:manage', 'programs:read', 'programs:manage', 'audit:read'],
  areas: ['clinic'],
  firstPath: '/clinic',
};

export const patientUser: CurrentUser = {
  ...coordinator,
  id: id(4),
  displayName: 'Leland Brask',
  title: 'Patient',
  abilities: ['me:read'],
  areas: ['home'],
  firstPath: '/home',
  idleSeconds: null,
  patientId: id(100),
};

export const listed = (number: number, changes: Partial<PatientListItem> = {}): PatientListItem => ({
  id: id(100 + number),
  givenName: 'Leland',
  familyName: `Brask ${number}`,
  birthDate: '1959-03-02',
  ageYears: 67,
  recordNumber: `A-${number}`,
  diagnosisGroup: 'copd',
  enrollment: { status: 'active', programName: 'Standard course', startOn: '2026-09-14', plannedSessions: 24 },
  pattern: { id: 'obstructive', heading: 'Obstructive, severe', provisional: false, takenOn: '2026-10-12' },
  lastTestOn: '2026-10-12',
  openFlags: 0,
  ...changes,
});

export const createdPatient = (patientId: string): Patient => ({
  id: patientId,
  givenName: 'Ruth',
  familyName: 'Valdane',
  birthDate: '1961-05-17',
  ageYears: 65,
  sexForPrediction: 'female',
  diagnosisGroup: 'copd',
  diagnosisConfirmed: false,
  recordNumber: 'A-500',
  email: null,
  phone: null,
  version: 1,
  createdAt: '2026-10-14T16:00:00Z',
  enrollment: null,
  oxygen: null,
  bodySize: null,
  pattern: null,
  openFlags: [],
  openHolds: 0,
  counts: { tests: 0, file: 0 },
  abilities: ['edit', 'enroll', 'record'],
  createdBy: { id: id(1), displayName: 'Mira Solberg' },
});
