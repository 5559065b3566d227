/** Calendar dates as `YYYY-MM-DD` strings. No clock and no time zone: callers say which date they mean. */
const msPerDay = 86_400_000;

export interface CalendarDate {
  year: number;
  month: number;
  day: number;
}

const daysInMonth = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31] as const;
const isLeap = (year: number): boolean => (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;

/** The number written in some digits of a text, NaN when one of them is no digit. */
function digits(text: string, from: number, to: number): number {
  let number = 0;
  for (let index = from; index < to; index += 1) {
    const digit = text.charCodeAt(index) - 48;
    if (!(digit >= 0 && digit <= 9)) return Number.NaN;
    number = number * 10 + digit;
  }
  return number;
}

/** Splits a date; throws RangeError when the text is not a day of the calendar. Read often, so without a pattern. */
export function parseDate(text: string): CalendarDate {
  const [year, month, day] = [digits(text, 0, 4), digits(text, 5, 7), digits(text, 8, 10)];
  const shaped = text.length === 10 && text[4] === '-' && text[7] === '-';
  const lastDay = month === 2 && isLeap(year) ? 29 : (daysInMonth[month - 1] ?? 0);
  if (!shaped || !(year >= 0) || !(day >= 1 && day <= lastDay)) throw new RangeError(`Not a calendar date: ${text}`);
  return { year, month, day };
}

/** Days since 1970-01-01, counted in years that begin in March so that a leap day is the last of its year. */
export function dayNumber(date: string): number {
  const { year, month, day } = parseDate(date);
  const marchYear = month > 2 ? year : year - 1;
  const dayOfYear = Math.floor((153 * ((month + 9) % 12) + 2) / 5) + day - 1;
  const leapDays = Math.floor(marchYear / 4) - Math.floor(marchYear / 100) + Math.floor(marchYear / 400);
  return marchYear * 365 + leapDays + dayOfYear - 719_468;
}

export const fromDayNumber = (day: number): string => new Date(day * msPerDay).toISOString().slice(0, 10);

/** Days from one date to a later one; negative when the second is earlier. */
export const daysBetween = (from: string, to: string): number => dayNumber(to) - dayNumber(from);

export const addDays = (date: string, days: number): string => fromDayNumber(dayNumber(date) + days);

/** Completed years; a birthday on February 29 is completed on March 1 of other years (rule 0.5). */
export function wholeYears(birthDate: string, onDate: string): number {
  const born = parseDate(birthDate);
  const on = parseDate(onDate);
  const beforeBirthday = on.month < born.month || (on.month === born.month && on.day < born.day);
  return on.year - born.year - (beforeBirthday ? 1 : 0);
}

const monthNames = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const;

/** A date as screens print it: `2026-10-12` is "Oct 12, 2026". */
export function dateInWords(date: string): string {
  const { year, month, day } = parseDate(date);
  return `${monthNames[month - 1]} ${day}, ${year}`;
}
