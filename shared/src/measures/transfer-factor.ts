import { defineMeasure, volume } from './define-measure';
import type { Condition } from './types';
import { dlcoVariability } from './variability';

/** Corrected and uncorrected results are never compared (rule GR-14). */
const hemoglobinCorrected: Condition = {
  label: 'Corrected for hemoglobin',
  type: 'boolean',
  default: false,
  onDifference: 'blocks',
};

// Plausible and absolute ranges: rule 0.7, set by this product.
const common = { group: 'transfer-factor', referenceKind: 'transfer-factor', axisFrom: 0 } as const;

export const dlco = defineMeasure({
  ...common,
  id: 'dlco',
  label: 'Transfer factor (DLCO)',
  shortLabel: 'DLCO',
  unit: { symbol: 'mL/min/mmHg', ucum: 'mL/min/mm[Hg]' },
  loinc: '19911-7',
  decimals: 1,
  plausible: { min: 3, max: 45 },
  absolute: { min: 0.5, max: 70 },
  direction: 'higher',
  variability: dlcoVariability,
  conditions: { hemoglobinCorrected },
  gradingRules: ['dlco-2005', 'ers-ats-2021'],
  defaultGradingRule: 'dlco-2005',
});

export const kco = defineMeasure({
  ...common,
  id: 'kco',
  label: 'Transfer coefficient (KCO)',
  shortLabel: 'KCO',
  unit: { symbol: 'mL/min/mmHg/L', ucum: 'mL/min/mm[Hg]/L' },
  codeNote: 'Local code',
  decimals: 2,
  plausible: { min: 1, max: 8 },
  absolute: { min: 0.2, max: 12 },
  direction: 'higher',
  conditions: { hemoglobinCorrected },
});

export const va = defineMeasure({
  ...common,
  ...volume,
  id: 'va',
  label: 'Alveolar volume (VA)',
  shortLabel: 'VA',
  codeNote: 'Local code',
  plausible: { min: 1.5, max: 10 },
  absolute: { min: 0.5, max: 14 },
  direction: 'none',
});
