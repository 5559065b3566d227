import { dayNumber } from '@slighthill/shared/calendar';
import { studentT975 } from './student-t';
import type { TrendRate } from './types';

export interface DatedValue {
  takenOn: string;
  value: number;
}

export interface RateResult {
  rate: TrendRate | null;
  /** Why there is no rate, or that the series is short. */
  note: string | null;
}

const daysPerYear = 365.25;
const leastDays = 90;

/**
 * Change per year (rule TR-5): ordinary least squares of the value on decimal years, one value a day, with the 95
 * percent interval of the slope by Student's t. No rate with fewer than 3 days or under 90 days from first to last.
 * Result in the unit of the values, per year. Days must be distinct and oldest first.
 * @example ratePerYear of 1.52, 1.49, 1.46 and 1.41 L at 0, 0.5, 1 and 2 years // about -0.055 L
 */
export function ratePerYear(days: readonly DatedValue[]): RateResult {
  const numbers = days.map((day) => dayNumber(day.takenOn));
  const span = numbers.length > 0 ? (numbers.at(-1) ?? 0) - (numbers[0] ?? 0) : 0;
  const counted = `${days.length} comparable ${days.length === 1 ? 'day' : 'days'}`;
  if (days.length < 3) return { rate: null, note: `No rate per year: ${counted}, 3 needed.` };
  if (span < leastDays) return { rate: null, note: `No rate per year: ${counted} over ${span} days, 90 needed.` };
  const first = numbers[0] ?? 0;
  const line = slopeWithError(
    numbers.map((day) => (day - first) / daysPerYear),
    days.map((day) => day.value),
  );
  const half = studentT975(days.length - 2) * line.standardError;
  const short = days.length < 4 || span < 365;
  return {
    rate: { value: line.slope, low: line.slope - half, high: line.slope + half },
    note: short ? `Short series: ${counted} over ${span} days.` : null,
  };
}

/** Ordinary least squares; at least three points whose x differ. */
export function slopeWithError(
  xs: readonly number[],
  ys: readonly number[],
): { slope: number; intercept: number; standardError: number } {
  const n = xs.length;
  const mean = (list: readonly number[]) => list.reduce((sum, item) => sum + item, 0) / n;
  const [meanX, meanY] = [mean(xs), mean(ys)];
  let [sxx, sxy] = [0, 0];
  xs.forEach((x, index) => {
    sxx += (x - meanX) ** 2;
    sxy += (x - meanX) * ((ys[index] ?? 0) - meanY);
  });
  if (n < 3 || sxx === 0) throw new RangeError('a slope needs three points at different times');
  const slope = sxy / sxx;
  const intercept = meanY - slope * meanX;
  const residuals = xs.reduce((sum, x, index) => sum + ((ys[index] ?? 0) - intercept - slope * x) ** 2, 0);
  return { slope, intercept, standardError: Math.sqrt(residuals / (n - 2) / sxx) };
}
