import type { Lms, Predicted } from './types';

/** The fifth percentile as the standards define it: 1.645, not 1.65 nor 1.6449 (rule PV-1). */
export const limitZ = 1.645;

/**
 * z-score of a measured value. LMS method (Cole and Green 1992, as used by every GLI set; rule PV-1).
 * `value` in the unit of M, above 0. Result: any real number, 0 at M. Throws RangeError for a value that is not
 * positive.
 * @example zFromLms(1.32, { l: 1.22703, m: 2.95, s: 0.155 }) // -3.2978
 */
export function zFromLms(value: number, { l, m, s }: Lms): number {
  if (!(value > 0)) throw new RangeError(`value ${value} must be more than 0`);
  return Math.abs(l) < 1e-9 ? Math.log(value / m) / s : ((value / m) ** l - 1) / (l * s);
}

/**
 * Value at a z-score, the inverse of `zFromLms` (rule PV-1). Result in the unit of M.
 * Throws RangeError where the distribution has no such value.
 * @example valueAtZ(-1.645, { l: 1.22703, m: 2.95, s: 0.155 }) // 2.1728
 */
export function valueAtZ(z: number, { l, m, s }: Lms): number {
  if (Math.abs(l) < 1e-9) return m * Math.exp(s * z);
  const base = 1 + z * l * s;
  if (base <= 0) throw new RangeError(`z ${z} has no value with L ${l} and S ${s}`);
  return m * base ** (1 / l);
}

/** Predicted value with the limits of normal at z = -1.645 and +1.645 (rule PV-1). */
export const limitsFromLms = (lms: Lms): Predicted => ({
  predicted: lms.m,
  lln: valueAtZ(-limitZ, lms),
  uln: valueAtZ(limitZ, lms),
  lms,
});
