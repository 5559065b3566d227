/** Calendar dates as `YYYY-MM-DD` strings. No clock and no time zone: callers say which date they mean. */
const msPerDay = 86_400_000;

export interface CalendarDate {
  year: number;
  month: number;
  day: number;
}

/** Splits a date; throws RangeError when the text is not a day of the calendar. */
export function parseDate(text: string): CalendarDate {
  const match = /^(\d{4})-(\d{2})-(\d{2})$/.exec(text);
  if (match) {
    const [year, month, day] = [Number(match[1]), Number(match[2]), Number(match[3])];
    const instant = new Date(Date.UTC(year, month - 1, day));
    if (instant.getUTCMonth() === month - 1 && instant.getUTCDate() === day) return { year, month, day };
  }
  throw new RangeError(`Not a calendar date: ${text}`);
}

/** Days since 1970-01-01. */
export function dayNumber(date: string): number {
  const { year, month, day } = parseDate(date);
  return Date.UTC(year, month - 1, day) / msPerDay;
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
