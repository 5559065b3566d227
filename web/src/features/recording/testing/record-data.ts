import type { Draft } from '@slighthill/shared/contracts/draft';
import type { Measurement, TestListItem } from '@slighthill/shared/contracts/measurement';
import type { Patient } from '@slighthill/shared/contracts/patient';
import type { PredictionResponse } from '@slighthill/shared/contracts/prediction';
import type { SpirometryTest } from '@slighthill/shared/contracts/spirometry-test';
import { createdPatient } from '../../../testing/people';

export const idOf = (number: number): string => `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`;

export const ruth: Patient = {
  ...createdPatient(idOf(100)),
  bodySize: { heightCm: 165, heightMethod: 'measured', heightOn: '2026-08-24', weightKg: 61.5, weightOn: '2026-08-24' },
  abilities: ['record', 'amend', 'write-file'],
};

const jo = { id: idOf(1), displayName: 'Jo Ferris' };

export const spirometry = (number: number, changes: Partial<SpirometryTest> = {}): SpirometryTest => ({
  id: idOf(number),
  patientId: ruth.id,
  visitId: idOf(300),
  performedAt: '2026-08-24T16:26:00Z',
  performedOn: '2026-08-24',
  heightCm: 165,
  heightMethod: 'measured',
  weightKg: 61.5,
  bronchodilator: 'after',
  drug: 'Albuterol',
  doseMcg: 400,
  minutesSinceDose: 15,
  ownBronchodilatorHoursAgo: null,
  entry: 'maneuvers',
  best: { fev1: 1.43, fvc: 2.4, fev1fvc: 1.43 / 2.4, pef: 3.92, fef2575: null },
  maneuvers: [
    {
      fev1: 1.43,
      fvc: 2.4,
      pef: 3.92,
      fef2575: null,
      forcedTimeS: 9.8,
      fev1Accepted: true,
      fvcAccepted: true,
      reason: null,
    },
  ],
  quality: null,
  note: null,
  recordedBy: jo,
  recordedAt: '2026-08-24T16:40:00Z',
  version: 1,
  voided: null,
  ...changes,
});

export const measurementOf = (changes: Partial<Measurement>): Measurement => ({
  id: idOf(500),
  patientId: ruth.id,
  measure: 'cat',
  takenAt: '2026-10-14T16:26:00Z',
  takenOn: '2026-10-14',
  value: 18,
  heightCm: null,
  heightMethod: null,
  heightCarried: false,
  weightKg: null,
  conditions: {},
  item9: null,
  note: null,
  recordedBy: jo,
  recordedAt: '2026-10-14T16:26:00Z',
  version: 1,
  voided: null,
  ...changes,
});

export const listedTest = (number: number, changes: Partial<TestListItem> = {}): TestListItem => ({
  kind: 'spirometry-test',
  id: idOf(number),
  at: '2026-08-24T16:26:00Z',
  on: '2026-08-24',
  measure: null,
  state: 'after',
  values: { fev1: 1.43, fvc: 2.4 },
  heightCm: 165,
  recordedByName: 'Jo Ferris',
  amended: false,
  voided: false,
  ...changes,
});

export const draftOf = (content: Record<string, unknown>): Draft => ({
  content,
  savedAt: '2026-10-14T16:26:00Z',
  expiresAt: '2026-10-21T16:26:00Z',
});

/** Numbers of no equation: only their place on the screen is looked at. */
export const prediction: PredictionResponse = {
  referenceSet: 'gli-global-2022',
  measures: {
    fev1: {
      referenceSet: 'gli-global-2022',
      predicted: 2.32,
      lln: 1.65,
      uln: 2.99,
      value: 1.46,
      percentPredicted: 62.93,
      z: -2.1,
    },
    fvc: {
      referenceSet: 'gli-global-2022',
      predicted: 2.98,
      lln: 2.12,
      uln: 3.84,
      value: 2.47,
      percentPredicted: 82.9,
      z: -0.98,
    },
    fev1fvc: {
      referenceSet: 'gli-global-2022',
      predicted: 0.78,
      lln: 0.65,
      uln: 0.9,
      value: 0.59,
      percentPredicted: 75.8,
      z: -2.42,
    },
  },
  pattern: {
    id: 'obstruction',
    label: 'Obstructive',
    heading: 'Obstructive, moderate',
    provisional: false,
    ratioRule: 'fixed-ratio',
    lowByFixedRatio: true,
    lowByLln: true,
    spirometryTestId: null,
    tlcMeasurementId: null,
    severity: { rule: 'ats-ers-2005', measure: 'fev1', bandId: 'moderate', label: 'moderate' },
    notes: [],
  },
  grades: [],
  // two neighbors of the rule are enough for the words of one
  bands: {
    fev1: [
      { id: 'moderate', label: 'moderate', quantity: 'percent-predicted', from: 60, to: 70, colorStep: 2 },
      { id: 'severe', label: 'severe', quantity: 'percent-predicted', from: 35, to: 50, colorStep: 4 },
    ],
  },
  notes: [],
};
