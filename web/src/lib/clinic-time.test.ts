import { describe, expect, it } from 'vitest';
import {
  clinicDateOf,
  formatClock,
  formatDate,
  formatInstant,
  formatLongDate,
  fromLocalInput,
  toLocalInput,
} from './clinic-time';

const denver = 'America/Denver';

describe('dates and times in the clinic zone', () => {
  it('writes a calendar date without moving it to another day', () => {
    expect(formatDate('2026-03-01')).toBe('Mar 1, 2026');
    expect(formatLongDate('2026-10-19')).toBe('Monday, October 19');
  });

  it('writes an instant by the clinic clock, not the reader clock', () => {
    expect(formatInstant('2026-10-14T16:12:00Z', denver)).toBe('Oct 14, 2026, 10:12 am');
    expect(formatClock(new Date('2026-10-14T16:12:00Z'), denver)).toBe('Wed, Oct 14 · 10:12 am');
  });

  it("finds the clinic's date of an instant near midnight", () => {
    expect(clinicDateOf('2026-10-15T05:59:00Z', denver)).toBe('2026-10-14');
    expect(clinicDateOf('2026-10-15T06:00:00Z', denver)).toBe('2026-10-15');
  });
});

describe('fromLocalInput', () => {
  // Clock changes of 2026 in the zone America/Denver: forward on March 8, back on November 1, both at 2 am (IANA tz database).
  it.each([
    ['2026-10-14T10:12', '2026-10-14T10:12:00-06:00'],
    ['2026-01-14T10:12', '2026-01-14T10:12:00-07:00'],
    ['2026-03-08T03:30', '2026-03-08T03:30:00-06:00'],
    ['2026-11-01T00:30', '2026-11-01T00:30:00-06:00'],
    ['2026-11-01T02:30', '2026-11-01T02:30:00-07:00'],
  ])('reads %s as %s', (local, instant) => {
    expect(fromLocalInput(local, denver)).toBe(instant);
    expect(toLocalInput(instant, denver)).toBe(local);
  });

  it('takes the earlier of an hour that happens twice', () => {
    expect(fromLocalInput('2026-11-01T01:30', denver)).toBe('2026-11-01T01:30:00-06:00');
  });

  it('moves an hour that was skipped forward', () => {
    expect(fromLocalInput('2026-03-08T02:30', denver)).toBe('2026-03-08T03:30:00-06:00');
  });

  it('writes zones with half hours and those ahead of UTC', () => {
    expect(fromLocalInput('2026-06-01T09:00', 'Asia/Kolkata')).toBe('2026-06-01T09:00:00+05:30');
  });

  it.each(['', '2026-10-14', 'soon'])('is null for %j', (text) => {
    expect(fromLocalInput(text, denver)).toBeNull();
  });
});
