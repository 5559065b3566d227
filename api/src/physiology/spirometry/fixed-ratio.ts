import { snap } from '@slighthill/shared/format';

/**
 * Whether FEV1/FVC is below the fixed 0.70 (rule GR-1), on whole milliliters, so that 2.905/4.150 (exactly 0.70) is
 * not. Both above 0; throws RangeError otherwise.
 * @example isBelowFixedRatio(2905, 4150) // false
 */
export function isBelowFixedRatio(fev1Ml: number, fvcMl: number): boolean {
  if (!(fev1Ml > 0) || !(fvcMl > 0)) throw new RangeError('fev1Ml and fvcMl must be more than 0');
  return 10 * Math.round(fev1Ml) < 7 * Math.round(fvcMl);
}

/** The same for a ratio that was given as a number: snapped first (rules 0.2 and 0.3). */
export const isRatioBelowFixed = (ratio: number): boolean => snap(ratio) < 0.7;
