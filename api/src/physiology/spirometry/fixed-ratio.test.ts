import { describe, expect, it } from 'vitest';
import { isBelowFixedRatio, isRatioBelowFixed } from './fixed-ratio';

describe('the fixed ratio (rule GR-1)', () => {
  // Rule SP-1. "FEV1/FVC under 0.70 suggests obstruction" is common practice.
  it.each([
    [1320, 2780, true],
    [2100, 3000, false],
    [2905, 4150, false],
    [2620, 3710, false],
    [810, 1150, false],
    [2099, 3000, true],
  ])('%d over %d mL is below 0.70: %s', (fev1Ml, fvcMl, below) => {
    expect(isBelowFixedRatio(fev1Ml, fvcMl)).toBe(below);
    expect(isRatioBelowFixed(fev1Ml / fvcMl)).toBe(below);
  });

  // Rule 0.3: in doubles these fall below 0.70, in truth they equal it.
  it.each([
    [567, 810],
    [1134, 1620],
    [2268, 3240],
    [2877, 4110],
    [2905, 4150],
    [2933, 4190],
    [2961, 4230],
    [4536, 6480],
  ])('%d over %d mL is exactly 0.70 and not below', (fev1Ml, fvcMl) => {
    expect(fev1Ml / 1000 / (fvcMl / 1000)).toBeLessThan(0.7);
    expect(isBelowFixedRatio(fev1Ml, fvcMl)).toBe(false);
    expect(isRatioBelowFixed(fev1Ml / 1000 / (fvcMl / 1000))).toBe(false);
  });

  it('refuses what is no volume', () => {
    expect(() => isBelowFixedRatio(0, 1000)).toThrow(RangeError);
    expect(() => isBelowFixedRatio(1000, Number.NaN)).toThrow(RangeError);
  });
});
