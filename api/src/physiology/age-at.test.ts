import { expect, it } from 'vitest';
import { ageAt } from './age-at';

// Rule 0.5.
it.each([
  ['1958-03-14', '2025-09-30', 67.5483, 67],
  ['1950-12-31', '2026-01-01', 75.0034, 75],
  ['2008-02-29', '2026-02-28', 17.9986, 17],
  ['1961-07-02', '2025-07-01', 63.9973, 63],
  ['1961-07-02', '2025-07-02', 64.0, 64],
])('born %s, on %s', (birthDate, onDate, decimalYears, wholeYears) => {
  const age = ageAt(birthDate, onDate);
  expect(age.decimalYears).toBeCloseTo(decimalYears, 4);
  expect(age.wholeYears).toBe(wholeYears);
});

it('refuses a birth after the date', () => {
  expect(() => ageAt('2025-01-02', '2025-01-01')).toThrow(RangeError);
});
