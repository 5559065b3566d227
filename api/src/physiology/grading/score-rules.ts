import type { MeasureId } from '@slighthill/shared/measures';
import type { Band, GradingRule } from './types';

const scoreRule = (label: string, source: string, measures: MeasureId[], bands: Band[]): GradingRule => ({
  id: 'default',
  label,
  source,
  measures,
  quantity: 'value',
  gradedWhen: 'always',
  bands,
});

/** Rule OM-0; from memory, check before clinical use. */
export const catBands = scoreRule(
  'CAT impact',
  'CAT user guide; from memory, check before clinical use',
  ['cat'],
  [
    { id: 'low', label: 'low impact', from: null, to: 10, colorStep: 1 },
    { id: 'medium', label: 'medium impact', from: 10, to: 21, colorStep: 2 },
    { id: 'high', label: 'high impact', from: 21, to: 31, colorStep: 4 },
    { id: 'very-high', label: 'very high impact', from: 31, to: null, colorStep: 5 },
  ],
);

/** Rule OM-1. */
export const phq9Bands = scoreRule(
  'PHQ-9 severity',
  'Kroenke 2001',
  ['phq9'],
  [
    { id: 'minimal', label: 'minimal', from: null, to: 5, colorStep: 1 },
    { id: 'mild', label: 'mild', from: 5, to: 10, colorStep: 2 },
    { id: 'moderate', label: 'moderate', from: 10, to: 15, colorStep: 3 },
    { id: 'moderately-severe', label: 'moderately severe', from: 15, to: 20, colorStep: 4 },
    { id: 'severe', label: 'severe', from: 20, to: null, colorStep: 5 },
  ],
);

/** Rule OM-1. */
export const gad7Bands = scoreRule(
  'GAD-7 severity',
  'Spitzer 2006',
  ['gad7'],
  [
    { id: 'minimal', label: 'minimal', from: null, to: 5, colorStep: 1 },
    { id: 'mild', label: 'mild', from: 5, to: 10, colorStep: 2 },
    { id: 'moderate', label: 'moderate', from: 10, to: 15, colorStep: 4 },
    { id: 'severe', label: 'severe', from: 15, to: null, colorStep: 5 },
  ],
);

/** Rule OM-0: 8 to 10 possible, 11 and over probable; from memory, check before clinical use. */
export const hadsBands = scoreRule(
  'HADS',
  'Zigmond and Snaith 1983; from memory, check before clinical use',
  ['hadsAnxiety', 'hadsDepression'],
  [
    { id: 'normal', label: 'unlikely', from: null, to: 8, colorStep: 1 },
    { id: 'possible', label: 'possible', from: 8, to: 11, colorStep: 3 },
    { id: 'probable', label: 'probable', from: 11, to: null, colorStep: 5 },
  ],
);

/** Rule OM-4, WHO bands; from memory, check before clinical use. */
export const bmiBands = scoreRule(
  'BMI',
  'WHO; from memory, check before clinical use',
  ['bmi'],
  [
    { id: 'underweight', label: 'underweight', from: null, to: 18.5, colorStep: null },
    { id: 'healthy', label: 'healthy range', from: 18.5, to: 25, colorStep: null },
    { id: 'overweight', label: 'overweight', from: 25, to: 30, colorStep: null },
    { id: 'obesity', label: 'obesity', from: 30, to: null, colorStep: null },
  ],
);
