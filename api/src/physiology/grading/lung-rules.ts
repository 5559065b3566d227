import type { GradingRule } from './types';

const percent = 'percent-predicted';

/** Rule GR-3. Printed bands leave gaps (69.5; exactly 70); half-open intervals close them. */
export const atsErs2005: GradingRule = {
  id: 'ats-ers-2005',
  label: 'ATS/ERS 2005',
  source: 'Pellegrino 2005, ERJ 26:948',
  measures: ['fev1'],
  quantity: percent,
  gradedWhen: 'abnormal-pattern',
  bands: [
    { id: 'mild', label: 'mild', from: 70, to: null, colorStep: 1 },
    { id: 'moderate', label: 'moderate', from: 60, to: 70, colorStep: 2 },
    { id: 'moderately-severe', label: 'moderately severe', from: 50, to: 60, colorStep: 3 },
    { id: 'severe', label: 'severe', from: 35, to: 50, colorStep: 4 },
    { id: 'very-severe', label: 'very severe', from: null, to: 35, colorStep: 5 },
  ],
};

/** Rule GR-7; only for COPD confirmed by a clinician, after bronchodilator, with FEV1/FVC under 0.70. */
export const gold: GradingRule = {
  id: 'gold',
  label: 'GOLD',
  source: 'GOLD report, grades 1 to 4',
  measures: ['fev1'],
  quantity: percent,
  gradedWhen: 'abnormal-pattern',
  bands: [
    { id: 'gold-1', label: 'GOLD 1', from: 80, to: null, colorStep: 1 },
    { id: 'gold-2', label: 'GOLD 2', from: 50, to: 80, colorStep: 2 },
    { id: 'gold-3', label: 'GOLD 3', from: 30, to: 50, colorStep: 4 },
    { id: 'gold-4', label: 'GOLD 4', from: null, to: 30, colorStep: 5 },
  ],
};

const zBands = (steps: readonly [number, number, number]) =>
  [
    { id: 'normal', label: 'within normal limits', from: -1.645, to: null, colorStep: null },
    { id: 'mild', label: 'mild', from: -2.5, to: -1.645, colorStep: steps[0] },
    { id: 'moderate', label: 'moderate', from: -4, to: -2.5, colorStep: steps[1] },
    { id: 'severe', label: 'severe', from: null, to: -4, colorStep: steps[2] },
  ] as const;

/** Rule GR-4. The standard prints -1.65, -2.51 and -4.1; which side a limit belongs to is set by this product. */
const ersAts2021 = {
  id: 'ers-ats-2021',
  label: 'ERS/ATS 2021',
  source: 'Stanojevic 2022, ERJ 60:2101499',
  quantity: 'z',
} as const;

export const ersAts2021Fev1: GradingRule = {
  ...ersAts2021,
  measures: ['fev1'],
  gradedWhen: 'abnormal-pattern',
  bands: zBands([2, 4, 5]),
};

/** The restrictive palette has four steps. */
export const ersAts2021Tlc: GradingRule = {
  ...ersAts2021,
  measures: ['tlc'],
  gradedWhen: 'below-lln',
  bands: zBands([2, 3, 4]),
};

export const ersAts2021Dlco: GradingRule = {
  ...ersAts2021,
  measures: ['dlco'],
  gradedWhen: 'below-lln',
  bands: zBands([2, 4, 5]),
};

/** Rule GR-8: the LLN decides presence, the percentage the band. Handbook bands; another series (80/65/50) exists. */
export const tlcPercent: GradingRule = {
  id: 'tlc-percent',
  label: 'TLC percent predicted',
  source: 'Common handbook bands, 80, 70 and 50 percent',
  measures: ['tlc'],
  quantity: percent,
  gradedWhen: 'below-lln',
  bands: [
    { id: 'normal', label: 'not restricted', from: 80, to: null, colorStep: 1 },
    { id: 'mild', label: 'mild', from: 70, to: 80, colorStep: 2 },
    { id: 'moderate', label: 'moderate', from: 50, to: 70, colorStep: 3 },
    { id: 'severe', label: 'severe', from: null, to: 50, colorStep: 4 },
  ],
};

/** Rule GR-14: 60 and 40 percent belong to the moderate band. */
export const dlco2005: GradingRule = {
  id: 'dlco-2005',
  label: 'ATS/ERS 2005, DLCO',
  source: 'Pellegrino 2005, ERJ 26:948',
  measures: ['dlco'],
  quantity: percent,
  gradedWhen: 'low-transfer-factor',
  bands: [
    { id: 'mild', label: 'mild', from: 60, to: null, colorStep: 2 },
    { id: 'moderate', label: 'moderate', from: 40, to: 60, toInclusive: true, colorStep: 4 },
    { id: 'severe', label: 'severe', from: null, to: 40, colorStep: 5 },
  ],
};
