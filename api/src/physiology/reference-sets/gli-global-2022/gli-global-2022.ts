import { limitsFromLms } from '../lms';
import { measureOf } from '../measure-of';
import { splineAt } from '../spline-table';
import type { Lms, ReferencePerson, ReferenceSet } from '../types';
import { coefficients } from './coefficients';
import { splines } from './splines';

type GlobalMeasure = keyof typeof coefficients;
const measures = Object.keys(coefficients) as GlobalMeasure[];

/**
 * L, M, S of the race-neutral GLI Global 2022 equations (rule PV-2). Age 18 to 95 years, height in cm; M in L, the
 * ratio as a fraction. Throws RangeError outside the ages.
 * @example globalLms('fev1', { sex: 'male', ageYears: 26.5, heightCm: 184.2 }).m // 4.70748
 */
export function globalLms(measure: GlobalMeasure, { sex, ageYears, heightCm }: ReferencePerson): Lms {
  const c = coefficients[measure][sex];
  const spline = splines[measure][sex];
  const lnAge = Math.log(ageYears);
  return {
    m: Math.exp(c.a0 + c.a1 * Math.log(heightCm) + c.a2 * lnAge + splineAt(spline.m, ageYears)),
    s: Math.exp(c.p0 + c.p1 * lnAge + splineAt(spline.s, ageYears)),
    l: c.q0 + ('q1' in c ? c.q1 * lnAge : 0),
  };
}

export const gliGlobal2022: ReferenceSet = {
  id: 'gli-global-2022',
  title: 'GLI Global 2022',
  source: 'Bowerman 2023, AJRCCM 207:768',
  kind: 'spirometry',
  measures,
  groups: null,
  needsWeight: false,
  ages: () => ({ from: 18, to: 95 }),
  evaluate: (measure, person) => limitsFromLms(globalLms(measureOf(measures, measure), person)),
};
