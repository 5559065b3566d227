import { expect, it } from 'vitest';
import {
  cmToFeetInches,
  cmToInches,
  feetInchesToCm,
  feetToMeters,
  inchesToCm,
  kgToPounds,
  litersToMl,
  metersToFeet,
  mlToLiters,
  poundsToKg,
} from './units';

it('converts with the exact international definitions', () => {
  expect(inchesToCm(65)).toBeCloseTo(165.1, 10);
  expect(cmToInches(254)).toBeCloseTo(100, 10);
  expect(feetInchesToCm(5, 5)).toBeCloseTo(165.1, 10);
  expect(cmToFeetInches(165.1)).toEqual({ feet: 5, inches: 5 });
  expect(cmToFeetInches(182.8)).toEqual({ feet: 6, inches: 0 });
  expect(kgToPounds(poundsToKg(150))).toBeCloseTo(150, 10);
  expect(poundsToKg(1)).toBe(0.45359237);
  expect(litersToMl(4.15)).toBe(4150);
  expect(mlToLiters(2905)).toBe(2.905);
  expect(metersToFeet(feetToMeters(100))).toBeCloseTo(100, 10);
});
