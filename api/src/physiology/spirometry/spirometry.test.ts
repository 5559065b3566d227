import { describe, expect, it } from 'vitest';
import { responseBy2021, respondsBy2005 } from './bronchodilator-response';
import { fev1q } from './fev1q';

// Rules GR-9 (Pellegrino 2005) and GR-10 (Stanojevic 2022), example table.
describe('bronchodilator response', () => {
  it.each([
    [2000, 2400, 3200, true, 12.5, true],
    [1200, 1360, 2900, false, 5.52, false],
    [800, 980, 2600, false, 6.92, false],
    [1500, 1700, 2000, true, 10, false],
    [1500, 1680, 3000, false, 6, false],
    [2000, 2300, 3000, true, 10, false],
  ])('%d to %d mL, predicted %d', (before, after, predicted, by2005, percent, by2021) => {
    expect(respondsBy2005(before, after)).toBe(by2005);
    expect(responseBy2021(before, after, predicted).percentOfPredicted).toBeCloseTo(percent, 2);
    expect(responseBy2021(before, after, predicted).responds).toBe(by2021);
  });

  it('can ask for more than 12 percent and 200 mL', () => {
    expect(respondsBy2005(1500, 1700, { strict: true })).toBe(false);
    expect(respondsBy2005(2000, 2400, { strict: true })).toBe(true);
    expect(() => respondsBy2005(0, 100)).toThrow(RangeError);
  });
});

// Rule GR-13 (ERS/ATS 2021).
it.each([
  ['female', 0.9, 2.25],
  ['male', 1.32, 2.64],
  ['male', 0.55, 1.1],
  ['female', 2.1, 5.25],
] as const)('FEV1Q of a %s with %d L is %d', (sex, fev1L, expected) => {
  expect(fev1q(sex, fev1L)).toBeCloseTo(expected, 10);
  expect(() => fev1q(sex, 0)).toThrow(RangeError);
});
