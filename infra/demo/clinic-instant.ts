import { addDays, dayNumber } from '@slighthill/shared/calendar';

const msPerMinute = 60_000;

/** The instant of a wall-clock time in a zone; `minutes` counts from midnight. */
export function clinicInstant(date: string, minutes: number, timeZone: string): Date {
  const asUtc = dayNumber(date) * 86_400_000 + minutes * msPerMinute;
  const first = asUtc - offsetMs(new Date(asUtc), timeZone);
  // a second look, because the offset may have changed between the two
  return new Date(asUtc - offsetMs(new Date(first), timeZone));
}

/** Making a formatter takes a hundred times as long as using one. */
const formatters = new Map<string, Intl.DateTimeFormat>();

function formatterOf(timeZone: string): Intl.DateTimeFormat {
  const known = formatters.get(timeZone);
  if (known) return known;
  const made = new Intl.DateTimeFormat('en-CA', {
    timeZone,
    dateStyle: 'short',
    timeStyle: 'short',
    hourCycle: 'h23',
  });
  formatters.set(timeZone, made);
  return made;
}

/** How far the zone's wall clock is ahead of UTC at an instant. */
function offsetMs(instant: Date, timeZone: string): number {
  const part = Object.fromEntries(
    formatterOf(timeZone)
      .formatToParts(instant)
      .map(({ type, value }) => [type, Number(value)]),
  );
  const { year = 0, month = 1, day = 1, hour = 0, minute = 0 } = part;
  return Date.UTC(year, month - 1, day, hour, minute) - Math.floor(instant.getTime() / msPerMinute) * msPerMinute;
}

/** 1970-01-01 was a Thursday: 0 is Sunday. */
const weekday = (date: string) => (((dayNumber(date) + 4) % 7) + 7) % 7;

/** The day itself, or the Friday before a weekend. */
export const workdayUpTo = (date: string): string => addDays(date, weekday(date) === 6 ? -1 : weekday(date) ? 0 : -2);

/** The day itself, or the Monday after a weekend. */
export const workdayFrom = (date: string): string => addDays(date, weekday(date) === 6 ? 2 : weekday(date) ? 0 : 1);
