import { measureOf } from '../measure-of';
import type { Predicted, ReferencePerson, ReferenceSet } from '../types';
import { nhanesGroups, ratios, volumes, type NhanesGroup } from './coefficients';

const measures = ['fev1', 'fvc', 'fev1fvc'] as const;
type NhanesMeasure = (typeof measures)[number];
const adultManFrom = 20;

function groupOf(group: string | null | undefined): NhanesGroup {
  const known = nhanesGroups.find((id) => id === group);
  if (!known) throw new RangeError(`group ${String(group)} is not one of ${nhanesGroups.join(', ')}`);
  return known;
}

/**
 * Predicted value and LLN of NHANES III (rule PV-4). Women 18 to 80 years; men 18 to 80, the equation of the young
 * until the 20th birthday. Height in cm; result in L, the ratio as a fraction. The set publishes neither an upper limit
 * nor L, M, S. Throws RangeError for a group the paper does not print.
 * @example nhanesPredicted('fev1', { sex: 'male', ageYears: 65, heightCm: 172, group: 'caucasian' }).lln // 2.4138
 */
export function nhanesPredicted(measure: NhanesMeasure, person: ReferencePerson): Predicted {
  const { sex, ageYears, heightCm } = person;
  const group = groupOf(person.group);
  if (measure === 'fev1fvc') {
    const { c0, c1, cL } = ratios[sex][group];
    return { predicted: (c0 + c1 * ageYears) / 100, lln: (cL + c1 * ageYears) / 100, uln: null, lms: null };
  }
  const rows = volumes[measure][sex][group];
  const c = rows.young && ageYears < adultManFrom ? rows.young : rows.adult;
  const byAge = c.b0 + c.b1 * ageYears + c.b2 * ageYears ** 2;
  return { predicted: byAge + c.b3 * heightCm ** 2, lln: byAge + c.bL * heightCm ** 2, uln: null, lms: null };
}

export const nhanesIii1999: ReferenceSet = {
  id: 'nhanes-iii-1999',
  title: 'NHANES III 1999',
  source: 'Hankinson 1999, AJRCCM 159:179',
  kind: 'spirometry',
  measures,
  groups: nhanesGroups,
  needsWeight: false,
  ages: () => ({ from: 18, to: 80 }),
  evaluate: (measure, person) => nhanesPredicted(measureOf(measures, measure), person),
};
