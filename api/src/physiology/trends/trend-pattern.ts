import { dateInWords, daysBetween } from '@slighthill/shared/calendar';
import { formatNumber, formatPercentPredicted } from '@slighthill/shared/format';
import { goldApplies, judgePattern, patternBy, type PatternRules } from '../pattern/judge-pattern';
import type { Evaluator } from './evaluator';
import { stateReasons } from './reasons';
import { nearestTlc, patternTest, spirometryTests, type SpirometryTest } from './spirometry-tests';
import type { TrendMeasurement, TrendPattern } from './types';

/** The pattern of the patient, and what each test's own pattern says about its grade. */
export interface Patterns {
  current: TrendPattern | null;
  /** Whether the FEV1 of a test is graded: its own pattern is abnormal, and for GOLD its conditions hold. */
  gradesFev1: (sourceId: string) => boolean;
}

/** Newest test after bronchodilator whose quality counts, else the newest in another state (rule GR-0). */
export function decidingTest(tests: readonly SpirometryTest[]): SpirometryTest | null {
  const good = tests.filter((test) => test.qualityCounts);
  return good.findLast((test) => test.state === 'after') ?? good.at(-1) ?? null;
}

export function createPatterns(
  measurements: readonly TrendMeasurement[],
  evaluator: Evaluator,
  rules: PatternRules,
  tlcWindowDays: number,
): Patterns {
  const tests = spirometryTests(measurements);
  const tlcs = measurements.filter((result) => result.measure === 'tlc');
  const near = (test: SpirometryTest) => {
    const tlc = nearestTlc(tlcs, test.takenOn);
    return tlc && Math.abs(daysBetween(tlc.takenOn, test.takenOn)) <= tlcWindowDays ? tlc : null;
  };
  const bySource = new Map(tests.map((test) => [test.sourceId, test]));
  const graded = new Map<string, boolean>();

  function gradesFev1(sourceId: string): boolean {
    const found = graded.get(sourceId);
    if (found !== undefined) return found;
    const test = bySource.get(sourceId);
    const seen = test ? patternTest(test, near(test), evaluator) : null;
    const asked = seen !== null && (rules.fev1Rule !== 'gold' || goldApplies(seen, rules));
    const grades = asked && patternBy(rules.ratioRule, seen) !== 'normal';
    graded.set(sourceId, grades);
    return grades;
  }

  const deciding = decidingTest(tests);
  const current =
    deciding && currentPattern(deciding, near(deciding), { tests, tlcs, evaluator, rules, tlcWindowDays });
  return { current, gradesFev1 };
}

interface PatternContext {
  tests: readonly SpirometryTest[];
  tlcs: readonly TrendMeasurement[];
  evaluator: Evaluator;
  rules: PatternRules;
  tlcWindowDays: number;
}

function currentPattern(
  test: SpirometryTest,
  tlc: TrendMeasurement | null,
  context: PatternContext,
): TrendPattern | null {
  const { evaluator, rules } = context;
  const seen = patternTest(test, tlc, evaluator);
  const set = evaluator.setOf('fev1');
  if (!seen || !set) return null;
  const pattern = judgePattern(seen, rules);
  return {
    ...pattern,
    notes: [...extraNotes(test, tlc, context), ...pattern.notes],
    spirometryTestId: test.sourceId,
    tlcMeasurementId: tlc?.sourceId ?? null,
    values: {
      takenOn: test.takenOn,
      state: test.state,
      referenceSet: set.id,
      ratio: test.ratio.value,
      ratioLln: evaluator.evaluate(test.ratio).prediction?.lln ?? null,
      fev1PercentPredicted: evaluator.evaluate(test.fev1).assessed?.percentPredicted ?? null,
      tlcPercentPredicted: tlc ? (evaluator.evaluate(tlc).assessed?.percentPredicted ?? null) : null,
    },
  };
}

function extraNotes(
  test: SpirometryTest,
  tlc: TrendMeasurement | null,
  { tests, tlcs, evaluator, tlcWindowDays }: PatternContext,
): string[] {
  const notes: string[] = [];
  const newest = tests.at(-1);
  if (newest && newest !== test) {
    const why = newest.qualityCounts
      ? stateReasons[newest.state]
      : `of quality ${newest.fev1.quality ?? newest.fvc.quality}`;
    notes.push(`The newest test, of ${dateInWords(newest.takenOn)}, was not used: ${why}.`);
  }
  const far = tlc ? null : nearestTlc(tlcs, test.takenOn);
  if (far) {
    const percent = evaluator.evaluate(far).assessed?.percentPredicted;
    const shown = percent === undefined ? '' : `, ${formatPercentPredicted(percent)} of predicted`;
    notes.push(
      `TLC of ${dateInWords(far.takenOn)} (${formatNumber(far.value, 2)} L${shown}) is more than ${tlcWindowDays} days from this test and is not used.`,
    );
  }
  return notes;
}
