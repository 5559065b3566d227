import { snap } from '@slighthill/shared/format';
import type { Band, GradingRule } from './types';

const reaches = (value: number, band: Band): boolean => {
  if (band.to === null) return false;
  return band.toInclusive ? value > band.to : value >= band.to;
};

/**
 * The band an unrounded value lies in (rule 0.2: snapped first). Any real number has exactly one. Throws RangeError for
 * what is no number.
 * @example bandOf(atsErs2005, 69.99).id // moderate
 */
export function bandOf(rule: Pick<GradingRule, 'bands'>, value: number): Band {
  if (!Number.isFinite(value)) throw new RangeError(`value ${value} must be a number`);
  const exact = snap(value);
  let found: Band | null = null;
  // The band with the lowest upper limit that the value does not reach.
  for (const band of rule.bands) {
    if (reaches(exact, band)) continue;
    if (found === null || found.to === null || (band.to !== null && band.to < found.to)) found = band;
  }
  if (!found) throw new RangeError('the bands leave a gap');
  return found;
}
