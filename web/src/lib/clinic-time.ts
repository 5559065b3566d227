/** Dates and times as this product writes them: "Oct 12, 2026", "10:12 am", in the clinic's own zone. */

const formatters = new Map<string, Intl.DateTimeFormat>();

const formatter = (options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat => {
  const key = JSON.stringify(options);
  const known = formatters.get(key);
  if (known) return known;
  const made = new Intl.DateTimeFormat('en-US', options);
  formatters.set(key, made);
  return made;
};

const lowerDayPeriod = (text: string): string =>
  text.replace(/[\u202f\u00a0]/g, ' ').replace(/\b(AM|PM)\b/, (half) => half.toLowerCase());

const shortDate = { month: 'short', day: 'numeric', year: 'numeric' } as const;

/** A calendar date has no zone: it is read and written as UTC so that no reader's clock can move it. */
const calendarInstant = (on: string): Date => new Date(`${on}T00:00:00Z`);

/** `2026-10-12` as "Oct 12, 2026". */
export const formatDate = (on: string): string =>
  formatter({ ...shortDate, timeZone: 'UTC' }).format(calendarInstant(on));

/** `2026-10-12` as "Oct 12". */
export const formatDayMonth = (on: string): string =>
  formatter({ month: 'short', day: 'numeric', timeZone: 'UTC' }).format(calendarInstant(on));

/** `2026-10-12` as "Monday, October 12". */
export const formatLongDate = (on: string): string =>
  formatter({ weekday: 'long', month: 'long', day: 'numeric', timeZone: 'UTC' }).format(calendarInstant(on));

/** An instant as "Oct 12, 2026" in the clinic's zone. */
export const formatInstantDate = (at: string | Date, timeZone: string): string =>
  formatter({ ...shortDate, timeZone }).format(new Date(at));

/** An instant as "10:12 am" in the clinic's zone. */
export const formatTime = (at: string | Date, timeZone: string): string =>
  lowerDayPeriod(formatter({ hour: 'numeric', minute: '2-digit', timeZone }).format(new Date(at)));

/** An instant as "Oct 12, 2026, 10:12 am" in the clinic's zone. */
export const formatInstant = (at: string | Date, timeZone: string): string =>
  `${formatInstantDate(at, timeZone)}, ${formatTime(at, timeZone)}`;

/** The clock of the top bar: "Wed, Oct 14 · 10:12 am". */
export const formatClock = (at: Date, timeZone: string): string =>
  `${formatter({ weekday: 'short', month: 'short', day: 'numeric', timeZone }).format(at)} · ${formatTime(at, timeZone)}`;

const zonedParts = (at: Date, timeZone: string): Record<string, string> => {
  const parts = formatter({
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
    hourCycle: 'h23',
    timeZone,
  }).formatToParts(at);
  return Object.fromEntries(parts.map((part) => [part.type, part.value]));
};

/** The clinic's calendar date of an instant. */
export const clinicDateOf = (at: string | Date, timeZone: string): string => {
  const parts = zonedParts(new Date(at), timeZone);
  return `${parts.year}-${parts.month}-${parts.day}`;
};

/** The value of a native date-and-time field, `2026-10-12T10:12`, in the clinic's zone. */
export const toLocalInput = (at: string | Date, timeZone: string): string => {
  const parts = zonedParts(new Date(at), timeZone);
  return `${parts.year}-${parts.month}-${parts.day}T${parts.hour}:${parts.minute}`;
};

const offsetMinutes = (at: Date, timeZone: string): number => {
  const parts = zonedParts(at, timeZone);
  const asUtc = Date.parse(`${parts.year}-${parts.month}-${parts.day}T${parts.hour}:${parts.minute}:${parts.second}Z`);
  return Math.round((asUtc - Math.floor(at.getTime() / 1000) * 1000) / 60_000);
};

/**
 * What a native date-and-time field holds, read in the clinic's zone, as an ISO instant with its offset.
 * Where clocks go back an hour happens twice: the earlier one is meant. A time that was skipped is moved forward.
 */
export const fromLocalInput = (local: string, timeZone: string): string | null => {
  const match = /^(\d{4}-\d{2}-\d{2})T(\d{2}:\d{2})/.exec(local);
  if (!match) return null;
  const wallUtc = Date.parse(`${match[1]}T${match[2]}:00Z`);
  if (Number.isNaN(wallUtc)) return null;
  const dayMs = 86_400_000;
  const offsets = [
    offsetMinutes(new Date(wallUtc - dayMs), timeZone),
    offsetMinutes(new Date(wallUtc + dayMs), timeZone),
  ];
  const candidates = offsets.map((offset) => new Date(wallUtc - offset * 60_000));
  const exact = candidates.find((candidate) => toLocalInput(candidate, timeZone) === `${match[1]}T${match[2]}`);
  const instant = exact ?? candidates[0] ?? new Date(wallUtc);
  const offset = offsetMinutes(instant, timeZone);
  const wall = new Date(instant.getTime() + offset * 60_000).toISOString().slice(0, 19);
  const two = (value: number): string => String(value).padStart(2, '0');
  const size = Math.abs(offset);
  return `${wall}${offset < 0 ? '-' : '+'}${two(Math.floor(size / 60))}:${two(size % 60)}`;
};
