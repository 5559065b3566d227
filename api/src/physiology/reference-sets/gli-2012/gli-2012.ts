import { limitsFromLms } from '../lms';
import { measureOf } from '../measure-of';
import { splineAt } from '../spline-table';
import type { Lms, ReferencePerson, ReferenceSet } from '../types';
import { coefficients } from './coefficients';
import { splines } from './splines';

type Gli2012Measure = keyof typeof coefficients;
const measures = Object.keys(coefficients) as Gli2012Measure[];

const groups = ['caucasian', 'african-american', 'north-east-asian', 'south-east-asian', 'other'] as const;
type Group = (typeof groups)[number];

/** Which terms a group adds to ln(M) and ln(S); the base group adds none. */
const groupTerms: Record<Group, { m: 'a3' | 'a4' | 'a5' | 'a6'; s: 'p2' | 'p3' | 'p4' | 'p5' } | null> = {
  caucasian: null,
  'african-american': { m: 'a3', s: 'p2' },
  'north-east-asian': { m: 'a4', s: 'p3' },
  'south-east-asian': { m: 'a5', s: 'p4' },
  other: { m: 'a6', s: 'p5' },
};

/**
 * L, M, S of the GLI-2012 equations, kept to compare with older reports (rule PV-6). Age 18 to 95 years, height in cm,
 * one of five groups, which is asked and never guessed. M in L, the ratio as a fraction. Throws RangeError outside the
 * ages and for a group the paper does not print.
 * @example gli2012Lms('fvc', { sex: 'male', ageYears: 68.5, heightCm: 172, group: 'south-east-asian' }).m // 3.53495
 */
export function gli2012Lms(measure: Gli2012Measure, { sex, ageYears, heightCm, group }: ReferencePerson): Lms {
  const known = groups.find((id) => id === group);
  if (!known) throw new RangeError(`group ${String(group)} is not one of ${groups.join(', ')}`);
  const c = coefficients[measure][sex];
  const spline: { m?: readonly number[]; s?: readonly number[]; l?: readonly number[] } = splines[measure][sex];
  const terms = groupTerms[known];
  const lnAge = Math.log(ageYears);
  return {
    m: Math.exp(
      c.a0 + c.a1 * Math.log(heightCm) + c.a2 * lnAge + (terms ? c[terms.m] : 0) + splineAt(spline.m, ageYears),
    ),
    s: Math.exp(c.p0 + c.p1 * lnAge + (terms ? c[terms.s] : 0) + splineAt(spline.s, ageYears)),
    l: c.q0 + c.q1 * lnAge + splineAt(spline.l, ageYears),
  };
}

export const gli2012: ReferenceSet = {
  id: 'gli-2012',
  title: 'GLI-2012',
  source: 'Quanjer 2012, ERJ 40:1324',
  kind: 'spirometry',
  measures,
  groups,
  needsWeight: false,
  ages: () => ({ from: 18, to: 95 }),
  evaluate: (measure, person) => limitsFromLms(gli2012Lms(measureOf(measures, measure), person)),
};
