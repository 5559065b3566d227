import { defineMeasure, volume } from './define-measure';
import type { Condition } from './types';

/** Dilution under-reads in severe obstruction, so methods are never compared with each other (rule LV-2). */
const method: Condition = {
  label: 'Method',
  type: 'choice',
  choices: ['plethysmography', 'helium', 'washout'],
  choiceLabels: ['Body plethysmography', 'Helium dilution', 'Nitrogen washout'],
  default: null,
  onDifference: 'blocks',
};

const slowMethod: Condition = {
  ...method,
  choices: ['plethysmography', 'helium', 'washout', 'spirometer'],
  choiceLabels: ['Body plethysmography', 'Helium dilution', 'Nitrogen washout', 'Spirometer, slow'],
};

// Plausible and absolute ranges: rule 0.7, set by this product.
const common = {
  ...volume,
  group: 'lung-volumes',
  direction: 'none',
  referenceKind: 'lung-volumes',
  conditions: { method },
} as const;

export const tlc = defineMeasure({
  ...common,
  id: 'tlc',
  label: 'Total lung capacity',
  shortLabel: 'TLC',
  loinc: '19862-2',
  codeNote: '19859-8 by plethysmography, 19857-2 by helium',
  plausible: { min: 2, max: 11 },
  absolute: { min: 1, max: 14 },
  gradingRules: ['tlc-percent', 'ers-ats-2021'],
  defaultGradingRule: 'tlc-percent',
});

export const rv = defineMeasure({
  ...common,
  id: 'rv',
  label: 'Residual volume',
  shortLabel: 'RV',
  loinc: '20146-7',
  plausible: { min: 0.5, max: 6 },
  absolute: { min: 0.2, max: 10 },
});

export const rvtlc = defineMeasure({
  ...common,
  id: 'rvtlc',
  label: 'RV/TLC',
  shortLabel: 'RV/TLC',
  unit: { symbol: '%', ucum: '%' },
  storage: { unit: '%', perUnit: 1 },
  codeNote: 'Local code',
  decimals: 0,
  plausible: { min: 15, max: 80 },
  absolute: { min: 5, max: 95 },
  entry: 'derived',
  derivedFrom: {
    measures: ['rv', 'tlc'],
    needsHeight: false,
    compute: ({ rv, tlc }) => (rv === undefined || !tlc ? null : (100 * rv) / tlc),
  },
});

export const frc = defineMeasure({
  ...common,
  id: 'frc',
  label: 'Functional residual capacity',
  shortLabel: 'FRC',
  codeNote: 'Local code',
  plausible: { min: 1, max: 8 },
  absolute: { min: 0.4, max: 12 },
});

export const ic = defineMeasure({
  ...common,
  id: 'ic',
  label: 'Inspiratory capacity',
  shortLabel: 'IC',
  codeNote: 'Local code',
  direction: 'higher',
  plausible: { min: 0.5, max: 7 },
  absolute: { min: 0.2, max: 10 },
  conditions: { method: slowMethod },
});

export const erv = defineMeasure({
  ...common,
  id: 'erv',
  label: 'Expiratory reserve volume',
  shortLabel: 'ERV',
  codeNote: 'Local code',
  plausible: { min: 0.1, max: 3 },
  absolute: { min: 0, max: 5 },
  conditions: { method: slowMethod },
});

export const vc = defineMeasure({
  ...common,
  id: 'vc',
  label: 'Slow vital capacity',
  shortLabel: 'VC',
  codeNote: 'Local code',
  direction: 'higher',
  plausible: { min: 0.5, max: 7 },
  absolute: { min: 0.2, max: 10 },
  conditions: { method: slowMethod },
});
