import { describe, expect, it } from 'vitest';
import { addDays, dateInWords, dayNumber, daysBetween, fromDayNumber, parseDate, wholeYears } from './calendar';

// Rule 0.5.
it.each([
  ['1958-03-14', '2025-09-30', 24672, 67],
  ['1950-12-31', '2026-01-01', 27395, 75],
  ['2008-02-29', '2026-02-28', 6574, 17],
  ['1961-07-02', '2025-07-01', 23375, 63],
  ['1961-07-02', '2025-07-02', 23376, 64],
])('from %s to %s are %d days and %d whole years', (born, on, days, years) => {
  expect(daysBetween(born, on)).toBe(days);
  expect(wholeYears(born, on)).toBe(years);
});

describe('calendar dates', () => {
  it('adds days across months and leap days', () => {
    expect(addDays('2024-02-28', 1)).toBe('2024-02-29');
    expect(addDays('2025-02-28', 1)).toBe('2025-03-01');
    expect(addDays('2025-01-31', 30)).toBe('2025-03-02');
    expect(addDays('2025-01-01', -1)).toBe('2024-12-31');
  });

  it.each(['2025-02-29', '2025-13-01', '2025-1-1', '', '2025-00-10', '20250101'])('refuses "%s"', (text) => {
    expect(() => parseDate(text)).toThrow(RangeError);
  });

  it('agrees with the calendar of the platform on every day of four centuries', () => {
    const first = Date.UTC(1799, 11, 31) / 86_400_000;
    for (let day = first; day < first + 146_100; day += 1) {
      const date = fromDayNumber(day);
      if (dayNumber(date) !== day) throw new Error(date);
    }
    expect(dayNumber('2000-02-29') + 1).toBe(dayNumber('2000-03-01'));
    expect(() => parseDate('1900-02-29')).toThrow(RangeError);
  });

  it('prints a date in words', () => {
    expect(dateInWords('2026-10-02')).toBe('Oct 2, 2026');
  });

  it('counts days from 1970', () => {
    expect(dayNumber('1970-01-01')).toBe(0);
    expect(dayNumber('1969-12-31')).toBe(-1);
  });
});
