import { heightLimitsCm, type MeasureId } from '@slighthill/shared/measures';
import type { Predicted, ReferencePerson, ReferenceSet } from './types';

/** Ages any prediction may be asked for; outside it is a mistake of the caller, not a gap of a set. */
export const predictionAges = { from: 18, to: 100 } as const;

export type NotPredictable =
  'no-equation' | 'age-outside-set' | 'no-height' | 'no-weight' | 'no-group' | 'size-outside-set';

export type Prediction = ({ computable: true } & Predicted) | { computable: false; reason: NotPredictable };

/**
 * Predicted value and limits of one measure for one person (rules PV-0 to PV-4), or the reason why there is none. Age
 * 18 to 100 decimal years, height 120.0 to 220.0 cm or null when unknown. The set decides its own ages; nothing is
 * extrapolated. Throws RangeError for an age or height outside those limits.
 * @example predict(gliGlobal2022, 'fev1', { sex: 'male', ageYears: 96, heightCm: 170 }) // { computable: false, reason: 'age-outside-set' }
 */
export function predict(
  set: ReferenceSet | null,
  measure: MeasureId,
  person: Omit<ReferencePerson, 'heightCm'> & { heightCm: number | null },
): Prediction {
  const { ageYears, heightCm } = person;
  if (!(ageYears >= predictionAges.from && ageYears <= predictionAges.to))
    throw new RangeError(`ageYears ${ageYears} must be ${predictionAges.from} to ${predictionAges.to}`);
  if (heightCm !== null && !(heightCm >= heightLimitsCm.min && heightCm <= heightLimitsCm.max))
    throw new RangeError(`heightCm ${heightCm} must be ${heightLimitsCm.min} to ${heightLimitsCm.max}`);
  const reason = whyNot(set, measure, person);
  if (reason !== null || set === null) return { computable: false, reason: reason ?? 'no-equation' };
  const found = set.evaluate(measure, person as ReferencePerson);
  // A linear equation can fall to 0 at the ends of height and weight, where it says nothing any more.
  if (!(found.predicted > 0)) return { computable: false, reason: 'size-outside-set' };
  const { predicted, lln, uln, lms } = found;
  return { computable: true, predicted, lln, uln, lms };
}

function whyNot(
  set: ReferenceSet | null,
  measure: MeasureId,
  person: Omit<ReferencePerson, 'heightCm'> & { heightCm: number | null },
): NotPredictable | null {
  if (!set?.measures.includes(measure)) return 'no-equation';
  const ages = set.ages(person.sex);
  if (person.ageYears < ages.from || person.ageYears > ages.to) return 'age-outside-set';
  if (person.heightCm === null) return 'no-height';
  if (set.needsWeight && !person.weightKg) return 'no-weight';
  if (set.groups && !set.groups.includes(person.group ?? '')) return 'no-group';
  return null;
}
