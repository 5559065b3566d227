import { getMeasure, type Measure, type MeasureId } from '@slighthill/shared/measures';
import { gradingRuleFor } from '../grading/index';
import { bandsOf } from '../grading/bands-of';
import type { Window } from './baseline-and-latest';
import { changeOf } from './change-of';
import { chooseComparable } from './comparable';
import type { Evaluator } from './evaluator';
import { pairNotes } from './pair-notes';
import { pointOf, type PointContext } from './point-of';
import { ratePerYear } from './rate-per-year';
import { leftOutNotes, noPairNotes, predictionNotes } from './series-notes';
import type { Patterns } from './trend-pattern';
import type { TrendInput, TrendMeasurement, TrendSeries } from './types';

export interface SeriesContext {
  input: TrendInput;
  evaluator: Evaluator;
  patterns: Patterns;
  window: Window;
}

/** One measure over time (rules TR-1 to TR-8). `results` are those of the measure, oldest first. */
export function computeSeries(
  id: MeasureId,
  results: readonly TrendMeasurement[],
  { input, evaluator, patterns, window }: SeriesContext,
): TrendSeries {
  const { options, person, clinic } = input;
  const measure = getMeasure(id);
  const rule = gradingRuleFor(id, options.gradingRule ?? null, clinic);
  // F is nowhere, not even in the table (rule TR-1 b).
  const shown = results.filter((result) => result.quality !== 'F');
  const comparable = chooseComparable(measure, shown, window, options);
  const includeLowQuality = options.includeLowQuality ?? false;
  const compared = new Set(comparable.days);
  const context: PointContext = {
    measure,
    rule,
    comparable,
    compared,
    includeLowQuality,
    gradesFev1: patterns.gradesFev1,
  };
  const evaluations = shown.map((result) => evaluator.evaluate(result));
  const points = shown.map((result, index) => pointOf(result, evaluations[index]!, context));
  const { baseline, latest, note } = comparable.pair;
  const set = evaluator.setOf(id);
  const changed = baseline && latest ? changeOf(measure, baseline, latest, person.diagnosisGroup) : null;
  const { rate, note: rateNote } = ratePerYear(comparable.days);
  return {
    measure: id,
    unit: measure.unit.symbol,
    referenceSet: set?.id ?? null,
    gradingRule: rule?.id ?? null,
    state: comparable.state,
    bands: rule ? bandsOf(rule) : [],
    points,
    baseline: points.find((point) => point.role === 'baseline') ?? null,
    latest: points.find((point) => point.role === 'latest') ?? null,
    change: changed?.change ?? null,
    zone: changed?.zone ?? null,
    ratePerYear: rate,
    percentPredictedRatePerYear: percentRate(measure, comparable.days, evaluator),
    notes: [
      ...leftOutNotes(points),
      ...(note ? [note] : []),
      ...noPairNotes(comparable, window.lastAllowedOn),
      ...(baseline && latest ? pairNotes(measure, baseline, latest, input.exacerbationOnsets) : []),
      ...(changed?.notes ?? []),
      ...predictionNotes(evaluations, set, person.sexForPrediction),
      ...(rateNote && points.length > 0 ? [rateNote] : []),
    ],
  };
}

/** In percentage points a year, over the comparable days with a prediction (rule TR-5); a ratio has none (rule 0.4). */
function percentRate(
  measure: Measure,
  days: readonly TrendMeasurement[],
  evaluator: Evaluator,
): TrendSeries['percentPredictedRatePerYear'] {
  if (measure.referenceKind === null || measure.unit.ucum === '1') return null;
  const percents = days.flatMap((day) => {
    const percent = evaluator.evaluate(day).assessed?.percentPredicted;
    return percent === undefined ? [] : [{ takenOn: day.takenOn, value: percent }];
  });
  return ratePerYear(percents).rate;
}
