import { defineMeasure, score } from './define-measure';

export const weight = defineMeasure({
  id: 'weight',
  label: 'Weight',
  shortLabel: 'Weight',
  group: 'body',
  unit: { symbol: 'kg', ucum: 'kg' },
  loinc: '29463-7',
  codeNote: 'From memory, to be checked at loinc.org',
  decimals: 1,
  plausible: { min: 35, max: 180 },
  absolute: { min: 20, max: 350 },
  direction: 'none',
  patientMayEnter: true,
  relativeChangeQuestion: { percent: 10 },
});

/** Weight over height squared (rule OM-4). */
export const bmi = defineMeasure({
  id: 'bmi',
  label: 'Body mass index',
  shortLabel: 'BMI',
  group: 'body',
  unit: { symbol: 'kg/m\u00b2', ucum: 'kg/m2' },
  loinc: '39156-5',
  codeNote: 'To be checked at loinc.org',
  decimals: 1,
  direction: 'none',
  gradingRules: ['default'],
  defaultGradingRule: 'default',
  entry: 'derived',
  derivedFrom: {
    measures: ['weight'],
    needsHeight: true,
    compute: ({ weight }, heightCm) => (weight === undefined || !heightCm ? null : weight / (heightCm / 100) ** 2),
  },
});

/** Composed of four measures taken within 28 days (rule OM-5); a later composition works it out. */
export const bode = defineMeasure({
  ...score,
  id: 'bode',
  label: 'BODE index',
  shortLabel: 'BODE',
  group: 'body',
  codeNote: 'Local code',
  absolute: { min: 0, max: 10 },
  direction: 'lower',
  entry: 'derived',
});
