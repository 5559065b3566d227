import { DateTime } from 'luxon';

/** The calendar date of an instant in the clinic's zone, `YYYY-MM-DD`. */
export function clinicDate(instant: Date, timeZone: string): string {
  const date = DateTime.fromJSDate(instant, { zone: timeZone }).toISODate();
  if (date === null) throw new RangeError(`Not a time zone: ${timeZone}`);
  return date;
}
