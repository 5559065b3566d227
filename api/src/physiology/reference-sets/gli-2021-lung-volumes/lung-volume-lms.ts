import { splineAt } from '../spline-table';
import type { Lms, ReferencePerson } from '../types';
import { coefficients } from './coefficients';
import { splines } from './splines';

export type LungVolume = keyof typeof coefficients;
export const lungVolumes = Object.keys(coefficients) as LungVolume[];

const linear = (x: number): number => x;

/** How age and height enter ln(M) and age enters ln(S), per measure (rule PV-3). */
const forms: Record<LungVolume, { age: typeof linear; height: typeof linear; spread: typeof linear }> = {
  frc: { age: Math.log, height: Math.log, spread: Math.log },
  tlc: { age: Math.log, height: Math.log, spread: linear },
  rv: { age: linear, height: linear, spread: linear },
  rvtlc: { age: linear, height: linear, spread: linear },
  erv: { age: linear, height: Math.log, spread: linear },
  ic: { age: linear, height: Math.log, spread: linear },
  vc: { age: linear, height: Math.log, spread: linear },
};

/**
 * L, M, S of the GLI 2021 static lung volumes (rule PV-3). Age 18 to 80 years, height in cm; M in L, RV/TLC in
 * percent. Throws RangeError outside the ages.
 * @example lungVolumeLms('frc', { sex: 'male', ageYears: 30, heightCm: 178 }).m // 3.307587, Hall 2021 supplement 1
 */
export function lungVolumeLms(measure: LungVolume, { sex, ageYears, heightCm }: ReferencePerson): Lms {
  const c = coefficients[measure][sex];
  const form = forms[measure];
  const spline: { m?: readonly number[]; s?: readonly number[] } = splines[measure][sex];
  return {
    m: Math.exp(c.a0 + c.a1 * form.age(ageYears) + c.a2 * form.height(heightCm) + splineAt(spline.m, ageYears)),
    s: Math.exp(c.p0 + c.p1 * form.spread(ageYears) + splineAt(spline.s, ageYears)),
    l: c.q0,
  };
}
