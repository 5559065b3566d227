import type { Sex } from '../types';

export const nhanesGroups = ['caucasian', 'african-american', 'mexican-american'] as const;
export type NhanesGroup = (typeof nhanesGroups)[number];

/** predicted = b0 + b1 age + b2 age² + b3 height², LLN with bL in place of b3; liters, years, cm. */
export interface VolumeRow {
  b0: number;
  b1: number;
  b2: number;
  b3: number;
  bL: number;
}

/** Men use `young` until their 20th birthday, women (18 and over here) never. */
interface VolumeRows {
  young: VolumeRow | null;
  adult: VolumeRow;
}

/**
 * NHANES III, tables 4 and 5. Source: Hankinson JL, Odencrantz JR, Fedan KB, Am J Respir Crit Care Med
 * 1999;159:179-187.
 */
export const volumes: Record<'fev1' | 'fvc', Record<Sex, Record<NhanesGroup, VolumeRows>>> = {
  fev1: {
    male: {
      caucasian: {
        young: { b0: -0.7453, b1: -0.04106, b2: 0.004477, b3: 0.00014098, bL: 0.00011607 },
        adult: { b0: 0.5536, b1: -0.01303, b2: -0.000172, b3: 0.00014098, bL: 0.00011607 },
      },
      'african-american': {
        young: { b0: -0.7048, b1: -0.05711, b2: 0.004316, b3: 0.00013194, bL: 0.00010561 },
        adult: { b0: 0.3411, b1: -0.02309, b2: 0, b3: 0.00013194, bL: 0.00010561 },
      },
      'mexican-american': {
        young: { b0: -0.8218, b1: -0.04248, b2: 0.004291, b3: 0.00015104, bL: 0.0001267 },
        adult: { b0: 0.6306, b1: -0.02928, b2: 0, b3: 0.00015104, bL: 0.0001267 },
      },
    },
    female: {
      caucasian: { young: null, adult: { b0: 0.4333, b1: -0.00361, b2: -0.000194, b3: 0.00011496, bL: 0.00009283 } },
      'african-american': {
        young: null,
        adult: { b0: 0.3433, b1: -0.01283, b2: -0.000097, b3: 0.00010846, bL: 0.00008546 },
      },
      'mexican-american': {
        young: null,
        adult: { b0: 0.4529, b1: -0.01178, b2: -0.000113, b3: 0.00012154, bL: 0.0000989 },
      },
    },
  },
  fvc: {
    male: {
      caucasian: {
        young: { b0: -0.2584, b1: -0.20415, b2: 0.010133, b3: 0.00018642, bL: 0.00015695 },
        adult: { b0: -0.1933, b1: 0.00064, b2: -0.000269, b3: 0.00018642, bL: 0.00015695 },
      },
      'african-american': {
        young: { b0: -0.4971, b1: -0.15497, b2: 0.007701, b3: 0.00016643, bL: 0.0001367 },
        adult: { b0: -0.1517, b1: -0.01821, b2: 0, b3: 0.00016643, bL: 0.0001367 },
      },
      'mexican-american': {
        young: { b0: -0.7571, b1: -0.0952, b2: 0.006619, b3: 0.00017823, bL: 0.00014947 },
        adult: { b0: 0.2376, b1: -0.00891, b2: -0.000182, b3: 0.00017823, bL: 0.00014947 },
      },
    },
    female: {
      caucasian: { young: null, adult: { b0: -0.356, b1: 0.0187, b2: -0.000382, b3: 0.00014815, bL: 0.00012198 } },
      'african-american': {
        young: null,
        adult: { b0: -0.3039, b1: 0.00536, b2: -0.000265, b3: 0.00013606, bL: 0.00010916 },
      },
      'mexican-american': {
        young: null,
        adult: { b0: 0.121, b1: 0.00307, b2: -0.000237, b3: 0.00014246, bL: 0.0001157 },
      },
    },
  },
};

/** FEV1/FVC in percent, all ages: predicted = c0 + c1 age, LLN = cL + c1 age. Table 6 of the same paper. */
export const ratios: Record<Sex, Record<NhanesGroup, { c0: number; c1: number; cL: number }>> = {
  male: {
    caucasian: { c0: 88.066, c1: -0.2066, cL: 78.388 },
    'african-american': { c0: 89.239, c1: -0.1828, cL: 78.822 },
    'mexican-american': { c0: 90.024, c1: -0.2186, cL: 80.925 },
  },
  female: {
    caucasian: { c0: 90.809, c1: -0.2125, cL: 81.015 },
    'african-american': { c0: 91.655, c1: -0.2039, cL: 80.978 },
    'mexican-american': { c0: 92.36, c1: -0.2248, cL: 83.044 },
  },
};
