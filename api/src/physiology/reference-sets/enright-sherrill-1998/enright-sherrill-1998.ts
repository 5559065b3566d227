import { measureOf } from '../measure-of';
import type { Predicted, ReferencePerson, ReferenceSet } from '../types';

const measures = ['sixMinuteWalkDistance'] as const;

/** How far below predicted the lower limit lies, m. From memory, check before clinical use. */
const belowPredictedM = { male: 153, female: 139 } as const;

/**
 * Predicted 6-minute walk distance in meters (rule OM-2). Age 40 to 80 years, height in cm, weight in kg. Equations
 * from Enright and Sherrill 1998, AJRCCM 158:1384, as tabled by the ERS; lower limits from memory. Throws RangeError
 * without a weight.
 * @example walkPredicted({ sex: 'male', ageYears: 65, heightCm: 172, weightKg: 78 }).predicted // 529.46
 */
export function walkPredicted({ sex, ageYears, heightCm, weightKg }: ReferencePerson): Predicted {
  if (!weightKg || !(weightKg > 0)) throw new RangeError('weightKg is needed for a predicted walk');
  const predicted =
    sex === 'male'
      ? 7.57 * heightCm - 5.02 * ageYears - 1.76 * weightKg - 309
      : 2.11 * heightCm - 2.29 * weightKg - 5.78 * ageYears + 667;
  return { predicted, lln: predicted - belowPredictedM[sex], uln: null, lms: null };
}

export const enrightSherrill1998: ReferenceSet = {
  id: 'enright-sherrill-1998',
  title: 'Enright and Sherrill 1998',
  source: 'Enright and Sherrill 1998, AJRCCM 158:1384',
  kind: 'walk',
  measures,
  groups: null,
  needsWeight: true,
  ages: () => ({ from: 40, to: 80 }),
  evaluate: (measure, person) => {
    measureOf(measures, measure);
    return walkPredicted(person);
  },
};
