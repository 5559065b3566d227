import { describe, expect, it } from 'vitest';
import { addDays, dayNumber, daysBetween, parseDate, wholeYears } from './calendar';

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

  it('counts days from 1970', () => {
    expect(dayNumber('1970-01-01')).toBe(0);
    expect(dayNumber('1969-12-31')).toBe(-1);
  });
});
