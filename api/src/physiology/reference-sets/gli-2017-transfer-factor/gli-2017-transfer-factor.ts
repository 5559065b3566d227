import { limitsFromLms } from '../lms';
import { measureOf } from '../measure-of';
import { splineAt } from '../spline-table';
import type { Lms, ReferencePerson, ReferenceSet } from '../types';
import { coefficients } from './coefficients';
import { splines } from './splines';

type TransferMeasure = keyof typeof coefficients;
const measures = Object.keys(coefficients) as TransferMeasure[];

/**
 * L, M, S of the GLI 2017 transfer factor, corrected 2020 (rule PV-0). Age 18 to 85 years, height in cm; DLCO in
 * mL/min/mmHg, KCO in mL/min/mmHg/L, VA in L, not corrected for hemoglobin. Throws RangeError outside the ages.
 * @example transferLms('dlco', { sex: 'male', ageYears: 75, heightCm: 160.6 }).m // 20.447446
 */
export function transferLms(measure: TransferMeasure, { sex, ageYears, heightCm }: ReferencePerson): Lms {
  const c = coefficients[measure][sex];
  const spline = splines[measure][sex];
  const lnAge = Math.log(ageYears);
  return {
    m: Math.exp(c.a0 + c.a1 * Math.log(heightCm) + c.a2 * lnAge + splineAt(spline.m, ageYears)),
    s: Math.exp(c.p0 + c.p1 * lnAge + splineAt(spline.s, ageYears)),
    l: c.q0,
  };
}

export const gli2017TransferFactor: ReferenceSet = {
  id: 'gli-2017-transfer-factor',
  title: 'GLI 2017 transfer factor',
  source: 'Stanojevic 2017, ERJ 50:1700010, corrected 2020',
  kind: 'transfer-factor',
  measures,
  groups: null,
  needsWeight: false,
  ages: () => ({ from: 18, to: 85 }),
  evaluate: (measure, person) => limitsFromLms(transferLms(measureOf(measures, measure), person)),
};
