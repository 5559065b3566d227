import { defineMeasure, volume } from './define-measure';
import { fef2575Variability, fev1Variability, fvcVariability } from './variability';

// Plausible and absolute ranges: rule 0.7, set by this product. LOINC codes: published code lists.
const common = {
  group: 'spirometry',
  usesBronchodilatorState: true,
  hasQuality: true,
  entry: 'spirometry-form',
} as const;

export const fev1 = defineMeasure({
  ...common,
  ...volume,
  id: 'fev1',
  label: 'FEV1',
  shortLabel: 'FEV1',
  loinc: '20150-9',
  codeNote: '20157-4 before and 20155-8 after bronchodilator',
  plausible: { min: 0.3, max: 6 },
  absolute: { min: 0.1, max: 8 },
  direction: 'higher',
  importantDifference: { value: 0.1, source: 'Donohue 2005; Jones 2014', note: 'Published range 0.10 to 0.14 L' },
  variability: fev1Variability,
  absoluteYardstick: { value: 0.225, diagnosisGroup: 'copd', source: 'Herpel 2006' },
  referenceKind: 'spirometry',
  gradingRules: ['ats-ers-2005', 'ers-ats-2021', 'gold'],
  defaultGradingRule: 'ats-ers-2005',
  relativeChangeQuestion: { percent: 30 },
});

export const fvc = defineMeasure({
  ...common,
  ...volume,
  id: 'fvc',
  label: 'FVC',
  shortLabel: 'FVC',
  loinc: '19868-9',
  codeNote: '19876-2 before and 19874-7 after bronchodilator; the latter to be checked at loinc.org',
  plausible: { min: 0.6, max: 8 },
  absolute: { min: 0.2, max: 10 },
  direction: 'higher',
  variability: fvcVariability,
  referenceKind: 'spirometry',
  relativeChangeQuestion: { percent: 30 },
});

export const fev1fvc = defineMeasure({
  ...common,
  id: 'fev1fvc',
  label: 'FEV1/FVC',
  shortLabel: 'FEV1/FVC',
  unit: { symbol: '', ucum: '1' },
  loinc: '19926-5',
  codeNote: 'Does not say before or after bronchodilator',
  decimals: 2,
  direction: 'higher',
  referenceKind: 'spirometry',
  entry: 'derived',
  axisFrom: 0.2,
  derivedFrom: {
    measures: ['fev1', 'fvc'],
    needsHeight: false,
    compute: ({ fev1, fvc }) => (fev1 === undefined || !fvc ? null : fev1 / fvc),
  },
});

export const pef = defineMeasure({
  ...common,
  id: 'pef',
  label: 'Peak expiratory flow',
  shortLabel: 'PEF',
  unit: { symbol: 'L/s', ucum: 'L/s' },
  loinc: '33452-4',
  decimals: 2,
  plausible: { min: 0.8, max: 14 },
  absolute: { min: 0.2, max: 20 },
  direction: 'higher',
  axisFrom: 0,
});

export const fef2575 = defineMeasure({
  ...common,
  id: 'fef2575',
  label: 'FEF25-75',
  shortLabel: 'FEF25-75',
  unit: { symbol: 'L/s', ucum: 'L/s' },
  codeNote: 'Local code',
  decimals: 2,
  plausible: { min: 0.1, max: 8 },
  absolute: { min: 0.03, max: 12 },
  direction: 'higher',
  variability: fef2575Variability,
  axisFrom: 0,
});
