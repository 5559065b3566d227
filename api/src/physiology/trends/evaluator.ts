import { dayNumber } from '@slighthill/shared/calendar';
import { getMeasure } from '@slighthill/shared/measures';
import { assess, type Assessed } from '../reference-sets/assess';
import { getReferenceSet, referenceSetFor } from '../reference-sets/index';
import { predict, predictionAges, type NotPredictable } from '../reference-sets/predict';
import type { Predicted, ReferenceSet } from '../reference-sets/types';
import type { TrendInput, TrendMeasurement } from './types';

export interface Evaluation {
  ageYears: number;
  prediction: Predicted | null;
  assessed: Assessed | null;
  reason: NotPredictable | null;
}

export interface Evaluator {
  setOf: (measure: TrendMeasurement['measure']) => ReferenceSet | null;
  evaluate: (result: TrendMeasurement) => Evaluation;
}

const without = (ageYears: number, reason: NotPredictable): Evaluation => ({
  ageYears,
  prediction: null,
  assessed: null,
  reason,
});

/**
 * Holds results to one reference set per kind, with the age and height of each test (rule TR-2). Each result is worked
 * out once, however many series and patterns look at it.
 */
export function createEvaluator({ person, options }: Pick<TrendInput, 'person' | 'options'>): Evaluator {
  const chosen = options.referenceSet ? getReferenceSet(options.referenceSet) : null;
  const born = dayNumber(person.birthDate);
  const known = new Map<TrendMeasurement, Evaluation>();
  const setOf: Evaluator['setOf'] = (measure) => referenceSetFor(measure, getMeasure(measure).referenceKind, chosen);

  function workOut(result: TrendMeasurement): Evaluation {
    const ageYears = (dayNumber(result.takenOn) - born) / 365.25;
    const set = setOf(result.measure);
    if (!set) return without(ageYears, 'no-equation');
    if (ageYears < predictionAges.from || ageYears > predictionAges.to) return without(ageYears, 'age-outside-set');
    const { heightCm, weightKg } = result;
    const subject = { sex: person.sexForPrediction, ageYears, heightCm, weightKg, group: options.group };
    const prediction = predict(set, result.measure, subject);
    if (!prediction.computable) return without(ageYears, prediction.reason);
    // A score or a distance of 0 has no z; its prediction is still shown.
    const assessed = result.value > 0 ? assess(result.value, prediction) : null;
    return { ageYears, prediction, assessed, reason: null };
  }

  function evaluate(result: TrendMeasurement): Evaluation {
    const found = known.get(result);
    if (found) return found;
    const evaluation = workOut(result);
    known.set(result, evaluation);
    return evaluation;
  }

  return { setOf, evaluate };
}
