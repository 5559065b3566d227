import { expect, it } from 'vitest';
import { assess } from './assess';
import { coefficients as global } from './gli-global-2022/coefficients';
import { coefficients as volumes } from './gli-2021-lung-volumes/coefficients';
import { limitsFromLms } from './lms';

// Arithmetic of the closed forms with made-up age terms, rules PV-2 and PV-3 (Bowerman 2023, Hall 2021). The age terms
// here are not the published ones.
const ln = Math.log;

it.each([
  ['male', 'fev1', 65, 172, -0.1, -0.02, 1.8, 1.22703, 3.09528, 0.14381, -2.7532, 2.3407, 58.15],
  ['female', 'fev1', 58, 160, -0.08, 0.01, 1.45, 1.21388, 2.26404, 0.16064, -2.1425, 1.6463, 64.04],
  ['male', 'fvc', 65, 172, -0.12, 0, 3.1, 0.9346, 3.77556, 0.14811, -1.2156, 2.8636, 82.11],
  ['female', 'fev1fvc', 58, 160, -0.01, 0.03, 0.55, 2.62104, 0.80854, 0.07766, -3.1233, 0.6921, 68.02],
] as const)('GLI Global 2022 %s %s', (sex, measure, age, height, ms, ss, value, l, m, s, z, lln, percent) => {
  const c: { a0: number; a1: number; a2: number; p0: number; p1: number; q0: number; q1?: number } =
    global[measure][sex];
  const lms = {
    m: Math.exp(c.a0 + c.a1 * ln(height) + c.a2 * ln(age) + ms),
    s: Math.exp(c.p0 + c.p1 * ln(age) + ss),
    l: c.q0 + (c.q1 ?? 0) * ln(age),
  };
  expect(lms.l).toBeCloseTo(l, 4);
  expect(lms.m).toBeCloseTo(m, 4);
  expect(lms.s).toBeCloseTo(s, 4);
  const limits = limitsFromLms(lms);
  expect(limits.lln).toBeCloseTo(lln, 3);
  expect(assess(value, limits).z).toBeCloseTo(z, 3);
  expect(assess(value, limits).percentPredicted).toBeCloseTo(percent, 1);
});

it.each([
  ['male', 'tlc', 65, 172, 0, 0, 5.1, 6.89718, 0.12038, -2.1852, 5.5409, 8.2715, 73.94],
  ['female', 'tlc', 58, 160, 0.02, -0.03, 4.4, 5.13073, 0.11993, -1.2366, 4.1718, 6.1967, 85.76],
  ['male', 'rv', 65, 172, 0.05, 0, 3.4, 2.22739, 0.26299, 1.8279, 1.3511, 3.2737, 152.65],
  ['female', 'frc', 58, 160, -0.02, 0.01, 3.1, 2.56224, 0.19988, 0.98, 1.8136, 3.5077, 120.99],
] as const)('GLI 2021 %s %s', (sex, measure, age, height, ms, ss, value, m, s, z, lln, uln, percent) => {
  const c = volumes[measure][sex];
  const [byAge, byHeight] = measure === 'rv' ? [age, height] : [ln(age), ln(height)];
  const lms = {
    m: Math.exp(c.a0 + c.a1 * byAge + c.a2 * byHeight + ms),
    s: Math.exp(c.p0 + c.p1 * (measure === 'frc' ? ln(age) : age) + ss),
    l: c.q0,
  };
  expect(lms.m).toBeCloseTo(m, 4);
  expect(lms.s).toBeCloseTo(s, 4);
  const limits = limitsFromLms(lms);
  expect(limits.lln).toBeCloseTo(lln, 3);
  expect(limits.uln).toBeCloseTo(uln, 3);
  expect(assess(value, limits).z).toBeCloseTo(z, 3);
  expect(assess(value, limits).percentPredicted).toBeCloseTo(percent, 1);
});
