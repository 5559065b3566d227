import type { Variability, VariabilityThreshold } from './types';

const source = 'Pellegrino 2005, ERJ 26:948, table 12';
const percent = (value: number): VariabilityThreshold => ({ value, quantity: 'percent', strict: false });
const moreThanPercent = (value: number): VariabilityThreshold => ({ value, quantity: 'percent', strict: true });
const moreThanRaw = (value: number): VariabilityThreshold => ({ value, quantity: 'raw', strict: true });

/** Rule GR-11: change beyond test variability. A null cell has no published threshold. */
export const fev1Variability: Variability = {
  source,
  rows: {
    'within-a-day': { normal: percent(5), copd: percent(13) },
    'week-to-week': { normal: percent(12), copd: percent(20) },
    'year-to-year': { normal: percent(15), copd: percent(15) },
  },
};

export const fvcVariability: Variability = {
  source,
  rows: {
    'within-a-day': { normal: percent(5), copd: percent(11) },
    'week-to-week': { normal: percent(11), copd: percent(20) },
    'year-to-year': { normal: percent(15), copd: percent(15) },
  },
};

export const fef2575Variability: Variability = {
  source,
  rows: {
    'within-a-day': { normal: percent(13), copd: percent(23) },
    'week-to-week': { normal: percent(21), copd: percent(30) },
    'year-to-year': { normal: null, copd: null },
  },
};

export const dlcoVariability: Variability = {
  source,
  rows: {
    'within-a-day': { normal: moreThanPercent(7), copd: null },
    'week-to-week': { normal: moreThanRaw(6), copd: moreThanRaw(4) },
    'year-to-year': { normal: moreThanPercent(10), copd: moreThanPercent(10) },
  },
};
