import { daysBetween, wholeYears } from '@slighthill/shared/calendar';

/**
 * Age on a calendar date (rule 0.5): decimal years are days over 365.25, fed to every equation unrounded; whole years
 * are completed ones, for legal and eligibility limits. Dates `YYYY-MM-DD`; throws RangeError for others and for a
 * birth after the date.
 * @example ageAt('1958-03-14', '2025-09-30') // { decimalYears: 67.5483, wholeYears: 67 }
 */
export function ageAt(birthDate: string, onDate: string): { decimalYears: number; wholeYears: number } {
  const days = daysBetween(birthDate, onDate);
  if (days < 0) throw new RangeError(`birthDate ${birthDate} is after ${onDate}`);
  return { decimalYears: days / 365.25, wholeYears: wholeYears(birthDate, onDate) };
}
