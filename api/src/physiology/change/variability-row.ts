import type { Measure, VariabilityInterval, VariabilityThreshold } from '@slighthill/shared/measures';

const hourMs = 3_600_000;
const yearMs = 52 * 7 * 24 * hourMs;

/** Interval row of rule GR-11 for two tests: under 24 hours, under 52 weeks, or longer (choice of rows: this product's). */
export function variabilityInterval(earlierAt: string, laterAt: string): VariabilityInterval {
  const apart = Date.parse(laterAt) - Date.parse(earlierAt);
  if (!(apart >= 0)) throw new RangeError(`${laterAt} is not after ${earlierAt}`);
  if (apart < 24 * hourMs) return 'within-a-day';
  return apart < yearMs ? 'week-to-week' : 'year-to-year';
}

/**
 * Threshold beyond which a change exceeds what the test varies by (rule GR-11; Pellegrino 2005, table 12). Population is
 * COPD when that is the diagnosis group. Null for a measure or a cell without a published threshold.
 */
export function variabilityThreshold(
  measure: Pick<Measure, 'variability'>,
  interval: VariabilityInterval,
  diagnosisGroup: string,
): VariabilityThreshold | null {
  return measure.variability?.rows[interval][diagnosisGroup === 'copd' ? 'copd' : 'normal'] ?? null;
}
