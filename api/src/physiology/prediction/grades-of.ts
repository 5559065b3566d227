import { snap } from '@slighthill/shared/format';
import type { MeasureId } from '@slighthill/shared/measures';
import { bandOf } from '../grading/band-of';
import { quantityOf } from '../grading/quantity-of';
import type { GradingRule } from '../grading/types';
import type { JudgedPattern } from '../pattern/judge-pattern';
import { gradeLowTlc } from '../pattern/severity-of';
import type { Grade, JudgedMeasures } from './types';

/**
 * Grades of the values given: FEV1 as the pattern's severity, TLC below its LLN, DLCO below its LLN or at most 60
 * percent, scores always (rules GR-0, GR-3, GR-4, GR-7, GR-8, GR-14, OM-0).
 */
export function gradesOf(
  judged: JudgedMeasures,
  pattern: JudgedPattern | null,
  ruleOf: (measure: MeasureId) => GradingRule | null,
): Grade[] {
  return (Object.keys(judged) as MeasureId[]).flatMap((id): Grade[] => {
    const measure = judged[id];
    const rule = ruleOf(id);
    if (!measure || measure.value === null || !rule) return [];
    if (id === 'fev1') return pattern?.severity?.measure === 'fev1' ? [pattern.severity] : [];
    const gradable = { ...measure, value: measure.value };
    if (id === 'tlc') {
      const grade = measure.belowLln ? gradeLowTlc(gradable, rule.id) : null;
      return grade ? [grade] : [];
    }
    const quantity = quantityOf(rule.quantity, gradable);
    if (quantity === null || !isGraded(rule, quantity, measure.belowLln)) return [];
    const band = bandOf(rule, quantity);
    return [{ rule: rule.id, measure: id, bandId: band.id, label: band.label }];
  });
}

/** Whether a band counts as a grade, for rules that do not look at the pattern. */
export function isGraded(rule: GradingRule, quantity: number, belowLln: boolean | null): boolean {
  if (rule.gradedWhen === 'low-transfer-factor') return belowLln === true || snap(quantity) <= 60;
  if (rule.gradedWhen === 'below-lln') return belowLln === true;
  return rule.gradedWhen === 'always';
}
