/**
 * GLI 2017 transfer factor, traditional units (DLCO mL/min/mmHg, KCO mL/min/mmHg/L, VA L), not corrected for hemoglobin:
 * M = exp(a0 + a1 ln(height) + a2 ln(age) + spline), S = exp(p0 + p1 ln(age) + spline), L = q0.
 * Source: Stanojevic S et al., Eur Respir J 2017;50:1700010, corrected 2020;56:1750010.
 */
export const coefficients = {
  dlco: {
    male: { a0: -7.03492, a1: 2.018368, a2: -0.012425, p0: -1.98996, p1: 0.03536, q0: 0.39482 },
    female: { a0: -5.159451, a1: 1.618697, a2: -0.01539, p0: -1.82905, p1: -0.01815, q0: 0.2416 },
  },
  kco: {
    male: { a0: 4.088408, a1: -0.415334, a2: -0.113166, p0: -1.98186, p1: 0.0146, q0: 0.6733 },
    female: { a0: 5.131492, a1: -0.645656, a2: -0.097395, p0: -1.63787, p1: -0.07757, q0: 0.48963 },
  },
  va: {
    male: { a0: -11.086573, a1: 2.430021, a2: 0.097047, p0: -2.20953, p1: 0.01937, q0: 0.62559 },
    female: { a0: -9.87397, a1: 2.182316, a2: 0.082868, p0: -2.08839, p1: -0.01334, q0: 0.51919 },
  },
} as const;
