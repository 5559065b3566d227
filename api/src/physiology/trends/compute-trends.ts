import type { MeasureId } from '@slighthill/shared/measures';
import { gradingRuleFor } from '../grading/index';
import { anchorOf, chooseEnrollment, latestAllowedOn } from './choose-enrollment';
import { computeSeries } from './compute-series';
import { createEvaluator } from './evaluator';
import { createPatterns } from './trend-pattern';
import type { TrendInput, TrendMeasurement, TrendResponse } from './types';

/**
 * Trends of one patient (rules GR-0, TR-1 to TR-8): the pattern with the test that decides it, and for every asked
 * measure its points, baseline and latest, change with verdict, rate per year, bands and notes. Measurements oldest
 * first, with FEV1, FVC, FEV1/FVC and TLC among them whatever is asked. A legacy reference set needs a group, which
 * `checkGroup` asks for; without one the points have no percent predicted. Throws RangeError for dates that are none.
 */
export function computeTrends(input: TrendInput): TrendResponse {
  const { person, measurements, clinic, options } = input;
  const chosenRule = options.gradingRule ?? null;
  const enrollment = chooseEnrollment(input.enrollments, options.enrollment);
  const evaluator = createEvaluator(input);
  const rules = {
    ratioRule: options.ratioRule ?? clinic.ratioRule,
    fev1Rule: gradingRuleFor('fev1', chosenRule, clinic)?.id ?? clinic.fev1SeverityRule,
    tlcRule: gradingRuleFor('tlc', chosenRule, clinic)?.id ?? clinic.tlcSeverityRule,
    copdConfirmed: person.diagnosisGroup === 'copd' && person.diagnosisConfirmed,
  };
  const patterns = createPatterns(measurements, evaluator, rules, clinic.tlcWindowDays);
  const window = { anchorOn: anchorOf(enrollment), lastAllowedOn: latestAllowedOn(enrollment) };
  const byMeasure = groupByMeasure(measurements);
  return {
    pattern: patterns.current,
    enrollment: enrollment && { id: enrollment.id, startOn: enrollment.startOn, endOn: enrollment.endOn },
    series: options.measures.map((id) =>
      computeSeries(id, byMeasure.get(id) ?? [], { input, evaluator, patterns, window }),
    ),
  };
}

function groupByMeasure(measurements: readonly TrendMeasurement[]): Map<MeasureId, TrendMeasurement[]> {
  const groups = new Map<MeasureId, TrendMeasurement[]>();
  for (const result of measurements) {
    const group = groups.get(result.measure);
    if (group) group.push(result);
    else groups.set(result.measure, [result]);
  }
  return groups;
}
