import { getMeasure, type GradingRuleId, type MeasureId } from '@slighthill/shared/measures';
import { atsErs2005, dlco2005, ersAts2021Dlco, ersAts2021Fev1, ersAts2021Tlc, gold, tlcPercent } from './lung-rules';
import { bmiBands, catBands, gad7Bands, hadsBands, phq9Bands } from './score-rules';
import type { GradingRule } from './types';

/** The one list of grading rules. A rule id may stand for several measures with bands of their own. */
export const gradingRules: readonly GradingRule[] = [
  atsErs2005,
  ersAts2021Fev1,
  gold,
  tlcPercent,
  ersAts2021Tlc,
  dlco2005,
  ersAts2021Dlco,
  catBands,
  phq9Bands,
  gad7Bands,
  hadsBands,
  bmiBands,
];

const byMeasure = new Map<string, GradingRule>(
  gradingRules.flatMap((rule) => rule.measures.map((measure) => [`${measure} ${rule.id}`, rule] as const)),
);

export const findGradingRule = (measure: MeasureId, id: GradingRuleId | null): GradingRule | null =>
  id === null ? null : (byMeasure.get(`${measure} ${id}`) ?? null);

export interface ClinicSeverityRules {
  fev1SeverityRule: GradingRuleId;
  tlcSeverityRule: GradingRuleId;
}

/**
 * The rule that grades a measure (rule GR-0): the one chosen in the view where it covers the measure, else the clinic's
 * for FEV1 and TLC, else the measure's own. Null for a measure without bands.
 * @example gradingRuleFor('tlc', 'gold', { fev1SeverityRule: 'ats-ers-2005', tlcSeverityRule: 'tlc-percent' })?.id // tlc-percent
 */
export function gradingRuleFor(
  measure: MeasureId,
  chosen: GradingRuleId | null,
  clinic: ClinicSeverityRules,
): GradingRule | null {
  const clinicRule = measure === 'fev1' ? clinic.fev1SeverityRule : measure === 'tlc' ? clinic.tlcSeverityRule : null;
  return (
    findGradingRule(measure, chosen) ??
    findGradingRule(measure, clinicRule) ??
    findGradingRule(measure, getMeasure(measure).defaultGradingRule)
  );
}
