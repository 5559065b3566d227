/**
 * GLI Global 2022, race-neutral. Natural logarithms, height in cm, age in years:
 * M = exp(a0 + a1 ln(height) + a2 ln(age) + spline), S = exp(p0 + p1 ln(age) + spline), L = q0 + q1 ln(age).
 * The ratio is a fraction.
 * Source: Bowerman C et al., Am J Respir Crit Care Med 2023;207:768-774.
 */
export const coefficients = {
  fev1: {
    male: { a0: -11.399108, a1: 2.462664, a2: -0.011394, p0: -2.256278, p1: 0.080729, q0: 1.22703 },
    female: { a0: -10.901689, a1: 2.385928, a2: -0.076386, p0: -2.364047, p1: 0.129402, q0: 1.21388 },
  },
  fvc: {
    male: { a0: -12.629131, a1: 2.727421, a2: 0.009174, p0: -2.195595, p1: 0.068466, q0: 0.9346 },
    female: { a0: -12.055901, a1: 2.621579, a2: -0.035975, p0: -2.310148, p1: 0.120428, q0: 0.899 },
  },
  fev1fvc: {
    male: { a0: 1.022608, a1: -0.218592, a2: -0.027586, p0: -2.882025, p1: 0.068889, q0: 3.8243, q1: -0.3328 },
    female: { a0: 0.9189568, a1: -0.1840671, a2: -0.0461306, p0: -3.171582, p1: 0.144358, q0: 6.649, q1: -0.992 },
  },
} as const;
