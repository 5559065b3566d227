import { patternOf, type PatternId } from './pattern-of';
import { patternHeading, patternLabels, type RatioRule } from './pattern-words';
import { isPrism } from './prism';
import { severityOf, type Severity } from './severity-of';
import type { GradingRuleId } from '@slighthill/shared/measures';
import type { Gradable } from '../grading/quantity-of';

export type BronchodilatorState = 'before' | 'after' | 'none' | 'unknown';

/** A value held to its reference set. */
export interface Judged extends Gradable {
  belowLln: boolean;
}

export interface PatternTest {
  ratioLowByFixed: boolean;
  ratioLowByLln: boolean;
  fev1: Judged;
  fvc: Judged;
  tlc: Judged | null;
  /** Why a TLC that was measured could not be held to a prediction. */
  tlcUnjudged?: string | null;
  state: BronchodilatorState;
}

export interface PatternRules {
  ratioRule: RatioRule;
  fev1Rule: GradingRuleId;
  tlcRule: GradingRuleId;
  /** Diagnosis COPD, confirmed by a clinician. */
  copdConfirmed: boolean;
}

export interface JudgedPattern {
  id: PatternId;
  label: string;
  heading: string;
  provisional: boolean;
  ratioRule: RatioRule;
  lowByFixedRatio: boolean;
  lowByLln: boolean;
  severity: Severity | null;
  notes: string[];
}

/** GOLD grades only confirmed COPD, after bronchodilator, with a ratio under 0.70 (rules GR-0, GR-7). */
export const goldApplies = (test: Pick<PatternTest, 'state' | 'ratioLowByFixed'>, rules: PatternRules): boolean =>
  rules.copdConfirmed && test.state === 'after' && test.ratioLowByFixed;

/**
 * Pattern, severity and words of one test (rules GR-0 to GR-8). "Low ratio" follows the chosen ratio rule; FVC, FEV1 and
 * TLC are always judged by the LLN. A test that is not after bronchodilator is provisional.
 */
export function judgePattern(test: PatternTest, rules: PatternRules): JudgedPattern {
  const id = patternBy(rules.ratioRule, test);
  const otherId = patternBy(rules.ratioRule === 'lln' ? 'fixed-ratio' : 'lln', test);
  const { fev1Rule, tlcRule } = rules;
  const graded = { patternId: id, fev1: test.fev1, tlc: test.tlc, fev1Rule, tlcRule };
  const { severity, note } = severityOf({ ...graded, goldApplies: goldApplies(test, rules) });
  const rulesAgree = test.ratioLowByFixed === test.ratioLowByLln;
  const heading = patternHeading({
    id,
    otherId,
    ratioRule: rules.ratioRule,
    rulesAgree,
    severityLabel: severity?.label ?? null,
  });
  return {
    id,
    label: patternLabels[id],
    heading,
    provisional: test.state !== 'after',
    ratioRule: rules.ratioRule,
    lowByFixedRatio: test.ratioLowByFixed,
    lowByLln: test.ratioLowByLln,
    severity,
    notes: notesOf(test, id, note),
  };
}

/** The pattern alone, by one ratio rule. */
export function patternBy(rule: RatioRule, test: PatternTest): PatternId {
  return patternOf({
    ratioLow: rule === 'lln' ? test.ratioLowByLln : test.ratioLowByFixed,
    fvcLow: test.fvc.belowLln,
    fev1Low: test.fev1.belowLln,
    tlcLow: test.tlc?.belowLln ?? null,
  });
}

const stateNotes: Record<BronchodilatorState, string | null> = {
  after: null,
  before: 'Provisional: taken before bronchodilator.',
  none: 'Provisional: no bronchodilator was given.',
  unknown: 'Provisional: it is not stated whether a bronchodilator was given.',
};

function notesOf(test: PatternTest, id: PatternId, severityNote: string | null): string[] {
  const { fvc, tlc } = test;
  const prism =
    test.state === 'after' &&
    isPrism({ ratioLow: test.ratioLowByFixed, fev1PercentPredicted: test.fev1.percentPredicted });
  const complex =
    tlc?.belowLln &&
    fvc.percentPredicted !== null &&
    tlc.percentPredicted !== null &&
    tlc.percentPredicted - fvc.percentPredicted > 10;
  return [
    stateNotes[test.state],
    tlc === null ? `${test.tlcUnjudged ?? 'No TLC'}, so restriction cannot be judged.` : null,
    severityNote,
    prism ? 'Preserved ratio with impaired FEV1 (PRISm): ratio 0.70 or more, FEV1 under 80% of predicted.' : null,
    complex ? 'Complex restriction: FVC is more than 10 percentage points below TLC.' : null,
    id === 'obstruction-fev1-normal' ? 'FEV1 is within normal limits; a low ratio alone can be dysanapsis.' : null,
  ].filter((note) => note !== null);
}
