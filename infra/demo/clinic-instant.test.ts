import { describe, expect, it } from 'vitest';
import { clinicInstant, workdayFrom, workdayUpTo } from './clinic-instant';

const at = (date: string, hours: number, zone = 'America/Denver') =>
  clinicInstant(date, hours * 60, zone).toISOString();

describe('a wall-clock time in the clinic\u2019s zone', () => {
  it('follows daylight-saving time: Denver is 7 hours behind UTC in winter and 6 in summer', () => {
    expect(at('2026-01-15', 9)).toBe('2026-01-15T16:00:00.000Z');
    expect(at('2026-07-15', 9)).toBe('2026-07-15T15:00:00.000Z');
    // clocks went forward at 2 in the morning of March 8, 2026, and back on November 1
    expect(at('2026-03-08', 1)).toBe('2026-03-08T08:00:00.000Z');
    expect(at('2026-03-08', 3)).toBe('2026-03-08T09:00:00.000Z');
    expect(at('2026-11-01', 0)).toBe('2026-11-01T06:00:00.000Z');
    expect(at('2026-11-01', 3)).toBe('2026-11-01T10:00:00.000Z');
  });

  it('works east of UTC too', () => {
    expect(at('2026-01-15', 0, 'Asia/Kolkata')).toBe('2026-01-14T18:30:00.000Z');
  });
});

describe('working days', () => {
  it('leave a weekday alone and step off a weekend', () => {
    // November 27, 2026 is a Friday
    expect(workdayUpTo('2026-11-27')).toBe('2026-11-27');
    expect(['2026-11-28', '2026-11-29'].map(workdayUpTo)).toEqual(['2026-11-27', '2026-11-27']);
    expect(['2026-11-28', '2026-11-29'].map(workdayFrom)).toEqual(['2026-11-30', '2026-11-30']);
    expect(workdayFrom('2026-11-30')).toBe('2026-11-30');
  });
});
