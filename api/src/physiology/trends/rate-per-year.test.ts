import { addDays } from '@slighthill/shared/calendar';
import { describe, expect, it } from 'vitest';
import { ratePerYear, slopeWithError } from './rate-per-year';
import { studentT975 } from './student-t';

describe('Student t, 97.5 percent', () => {
  // Printed in any table of the distribution.
  it.each([
    [1, 12.706],
    [2, 4.303],
    [3, 3.182],
    [4, 2.776],
    [5, 2.571],
    [10, 2.228],
    [30, 2.042],
    [120, 1.98],
  ])('%d degrees of freedom', (degrees, expected) => {
    expect(studentT975(degrees)).toBeCloseTo(expected, 3);
  });

  it('needs whole degrees of freedom', () => {
    expect(() => studentT975(0)).toThrow(RangeError);
    expect(() => studentT975(1.5)).toThrow(RangeError);
  });
});

describe('least squares (rule TR-5, example table)', () => {
  it('of FEV1 in L', () => {
    const line = slopeWithError([0, 0.5, 1, 2], [1.52, 1.49, 1.46, 1.41]);
    expect(line.slope).toBeCloseTo(-0.054857, 6);
    expect(line.intercept).toBeCloseTo(1.518, 6);
  });

  it('of percent predicted, in points', () => {
    const line = slopeWithError([0, 0.25, 0.75], [46, 47.5, 49]);
    expect(line.slope).toBeCloseTo(3.857143, 6);
    expect(line.intercept).toBeCloseTo(46.214286, 6);
  });

  it('refuses fewer than three points', () => {
    expect(() => slopeWithError([0, 1], [1, 2])).toThrow(RangeError);
  });
});

const day = (days: number, value: number) => ({ takenOn: addDays('2025-01-01', days), value });

describe('rate per year (rule TR-5)', () => {
  it('needs three days', () => {
    expect(ratePerYear([day(0, 1), day(400, 2)])).toEqual({
      rate: null,
      note: 'No rate per year: 2 comparable days, 3 needed.',
    });
    expect(ratePerYear([day(0, 1)]).note).toContain('1 comparable day,');
  });

  it('needs 90 days from first to last', () => {
    expect(ratePerYear([day(0, 1), day(30, 2), day(89, 3)])).toEqual({
      rate: null,
      note: 'No rate per year: 3 comparable days over 89 days, 90 needed.',
    });
    expect(ratePerYear([day(0, 1), day(30, 2), day(90, 3)]).rate).not.toBeNull();
  });

  it('gives the 95 percent interval', () => {
    // Slope and standard error by hand: x = 0, 1, 2, 3 years, y = 1, 3, 2, 5: slope 1.1, residual sum 2.7, error 0.51962.
    const days = [0, 365.25, 730.5, 1095.75].map((offset, index) => ({ offset, value: [1, 3, 2, 5][index] ?? 0 }));
    const { slope, standardError } = slopeWithError(
      days.map(({ offset }) => offset / 365.25),
      days.map(({ value }) => value),
    );
    expect(slope).toBeCloseTo(1.1, 10);
    expect(standardError).toBeCloseTo(0.519615, 6);
    const { rate } = ratePerYear([day(0, 1), day(365, 3), day(731, 2), day(1096, 5)]);
    expect(rate?.value).toBeCloseTo(1.1, 2);
    expect((rate?.high ?? 0) - (rate?.value ?? 0)).toBeCloseTo(4.3027 * 0.5196, 1);
    expect((rate?.high ?? 0) + (rate?.low ?? 0)).toBeCloseTo(2 * (rate?.value ?? 0), 10);
  });

  it.each([
    [3, 500, true],
    [4, 364, true],
    [4, 365, false],
  ])('%d days over %d days is a short series: %s', (count, span, short) => {
    const days = Array.from({ length: count }, (_, index) => day(Math.round((span * index) / (count - 1)), index));
    expect(ratePerYear(days).note?.startsWith('Short series') ?? false).toBe(short);
  });
});
