import type { GradingRuleId, MeasureId } from '@slighthill/shared/measures';
import { bandOf } from '../grading/band-of';
import { findGradingRule } from '../grading/index';
import { quantityOf, type Gradable } from '../grading/quantity-of';
import { obstructivePatterns, type PatternId } from './pattern-of';

export interface Severity {
  rule: GradingRuleId;
  measure: MeasureId;
  bandId: string;
  label: string;
}

export interface SeverityInputs {
  patternId: PatternId;
  fev1: Gradable;
  tlc: Gradable | null;
  fev1Rule: GradingRuleId;
  tlcRule: GradingRuleId;
  goldApplies: boolean;
}

/** What GOLD asks for before it grades (rule GR-7). */
export const goldNote =
  'GOLD grades need COPD confirmed by a clinician, a test after bronchodilator and FEV1/FVC under 0.70.';
const noZNote = 'No severity: this reference set gives no z-score.';

/** A TLC below its LLN at 80 percent or more is mild by presence, not by percentage (rule GR-8). */
export const mildByLln = { bandId: 'mild', label: 'mild (LLN)' } as const;

/** Grade of a TLC known to be below its LLN; null where the rule's number is missing. */
export function gradeLowTlc(tlc: Gradable, ruleId: GradingRuleId): Severity | null {
  const rule = findGradingRule('tlc', ruleId);
  const quantity = rule && quantityOf(rule.quantity, tlc);
  if (rule === null || quantity === null) return null;
  const band = bandOf(rule, quantity);
  const named = rule.id === 'tlc-percent' && band.id === 'normal' ? mildByLln : { bandId: band.id, label: band.label };
  return { rule: rule.id, measure: 'tlc', ...named };
}

/** Grade of the FEV1 of an obstructive or mixed test; null where the rule does not apply. */
export function gradeFev1(fev1: Gradable, ruleId: GradingRuleId, goldApplies: boolean): Severity | null {
  const rule = findGradingRule('fev1', ruleId);
  const quantity = rule && quantityOf(rule.quantity, fev1);
  if (rule === null || quantity === null || (rule.id === 'gold' && !goldApplies)) return null;
  const band = bandOf(rule, quantity);
  return { rule: rule.id, measure: 'fev1', bandId: band.id, label: band.label };
}

/**
 * Severity of a pattern (rule GR-0): obstruction and mixed by FEV1, restriction by TLC, nothing else. The note says why
 * a pattern that should have one has none.
 */
export function severityOf(inputs: SeverityInputs): { severity: Severity | null; note: string | null } {
  const { patternId, fev1, tlc, fev1Rule, tlcRule, goldApplies } = inputs;
  if (patternId === 'restriction') return withNote(tlc && gradeLowTlc(tlc, tlcRule), noZNote);
  if (patternId !== 'mixed' && !obstructivePatterns.includes(patternId)) return { severity: null, note: null };
  return withNote(gradeFev1(fev1, fev1Rule, goldApplies), fev1Rule === 'gold' && !goldApplies ? goldNote : noZNote);
}

const withNote = (severity: Severity | null, note: string) => ({ severity, note: severity ? null : note });
