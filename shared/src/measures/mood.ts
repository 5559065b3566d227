import { defineMeasure, score } from './define-measure';

const common = {
  ...score,
  group: 'mood',
  direction: 'lower',
  gradingRules: ['default'],
  defaultGradingRule: 'default',
} as const;

export const phq9 = defineMeasure({
  ...common,
  id: 'phq9',
  label: 'PHQ-9 depression score',
  shortLabel: 'PHQ-9',
  loinc: '44261-6',
  codeNote: 'To be checked at loinc.org',
  absolute: { min: 0, max: 27 },
  importantDifference: { value: 5, source: 'Löwe 2004, Med Care 42:1194; from memory, check before clinical use' },
  safetyItem: {
    label: 'Ninth answer',
    choices: ['0', '1', '2', '3', 'not-answered'],
    positiveFrom: 1,
    maxOfOthers: 24,
    source: 'Rule OM-1: any positive ninth answer is a safety matter, whatever the total',
  },
  hint: 'Enter the total and, by itself, the ninth answer.',
});

export const gad7 = defineMeasure({
  ...common,
  id: 'gad7',
  label: 'GAD-7 anxiety score',
  shortLabel: 'GAD-7',
  loinc: '70274-6',
  codeNote: 'To be checked at loinc.org',
  absolute: { min: 0, max: 21 },
  importantDifference: {
    value: 4,
    source: 'Toussaint 2020, J Affect Disord 265:395; from memory, check before clinical use',
  },
});

const hads = {
  ...common,
  codeNote: 'Local code',
  absolute: { min: 0, max: 21 },
  importantDifference: { value: 1.5, source: 'Puhan 2008; from memory, check before clinical use' },
  hint: 'Enter the total from the owner\u2019s form.',
} as const;

export const hadsAnxiety = defineMeasure({
  ...hads,
  id: 'hadsAnxiety',
  label: 'HADS anxiety',
  shortLabel: 'HADS-A',
});

export const hadsDepression = defineMeasure({
  ...hads,
  id: 'hadsDepression',
  label: 'HADS depression',
  shortLabel: 'HADS-D',
});
