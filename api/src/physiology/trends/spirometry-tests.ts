import { dateInWords, daysBetween } from '@slighthill/shared/calendar';
import type { BronchodilatorState, Judged, PatternTest } from '../pattern/judge-pattern';
import { isBelowFixedRatio } from '../spirometry/fixed-ratio';
import { qualityCounts } from './comparable';
import type { Evaluator } from './evaluator';
import { predictionReasons } from './reasons';
import type { TrendMeasurement } from './types';

/** The results of one spirometry test that a pattern rests on. */
export interface SpirometryTest {
  sourceId: string;
  takenAt: string;
  takenOn: string;
  state: BronchodilatorState;
  fev1: TrendMeasurement;
  fvc: TrendMeasurement;
  ratio: TrendMeasurement;
  qualityCounts: boolean;
}

/** Complete tests, oldest first. */
export function spirometryTests(measurements: readonly TrendMeasurement[]): SpirometryTest[] {
  const bySource = new Map<string, Record<'fev1' | 'fvc' | 'fev1fvc', TrendMeasurement | null>>();
  for (const result of measurements) {
    const { measure, sourceId } = result;
    if (measure !== 'fev1' && measure !== 'fvc' && measure !== 'fev1fvc') continue;
    let parts = bySource.get(sourceId);
    if (!parts) {
      parts = { fev1: null, fvc: null, fev1fvc: null };
      bySource.set(sourceId, parts);
    }
    parts[measure] = result;
  }
  const tests: SpirometryTest[] = [];
  for (const [sourceId, { fev1, fvc, fev1fvc }] of bySource) {
    if (!fev1 || !fvc || !fev1fvc) continue;
    const counts = qualityCounts(fev1.quality, false) && qualityCounts(fvc.quality, false);
    const { takenAt, takenOn } = fev1;
    const state = fev1.state ?? 'unknown';
    tests.push({ sourceId, takenAt, takenOn, state, fev1, fvc, ratio: fev1fvc, qualityCounts: counts });
  }
  return tests;
}

/** The TLC nearest in time to a day, whatever the distance; of two as near the newer. They are oldest first. */
export function nearestTlc(tlcs: readonly TrendMeasurement[], takenOn: string): TrendMeasurement | null {
  const after = tlcs.findIndex((tlc) => tlc.takenOn > takenOn);
  const later = after === -1 ? null : (tlcs[after] ?? null);
  const earlier = tlcs[(after === -1 ? tlcs.length : after) - 1] ?? null;
  if (!earlier || !later) return earlier ?? later;
  const [back, ahead] = [daysBetween(earlier.takenOn, takenOn), daysBetween(takenOn, later.takenOn)];
  if (back < ahead) return earlier;
  // Of several on the nearest later day the last.
  return tlcs.findLast((tlc) => tlc.takenOn === later.takenOn) ?? later;
}

export function judged(evaluator: Evaluator, result: TrendMeasurement): Judged | null {
  const { assessed } = evaluator.evaluate(result);
  if (!assessed) return null;
  const { percentPredicted, z, belowLln } = assessed;
  return { value: result.value, percentPredicted, z, belowLln };
}

function tlcUnjudged(tlc: TrendMeasurement, evaluator: Evaluator): string | null {
  const { reason } = evaluator.evaluate(tlc);
  return reason && `TLC of ${dateInWords(tlc.takenOn)} has no predicted value (${predictionReasons[reason]})`;
}

/** One test as the pattern rules look at it, or null where its values have no prediction. */
export function patternTest(
  test: SpirometryTest,
  tlc: TrendMeasurement | null,
  evaluator: Evaluator,
): PatternTest | null {
  const fev1 = judged(evaluator, test.fev1);
  const fvc = judged(evaluator, test.fvc);
  const ratio = judged(evaluator, test.ratio);
  if (!fev1 || !fvc || !ratio) return null;
  return {
    ratioLowByFixed: isBelowFixedRatio(test.fev1.value * 1000, test.fvc.value * 1000),
    ratioLowByLln: ratio.belowLln,
    fev1,
    fvc,
    tlc: tlc && judged(evaluator, tlc),
    tlcUnjudged: tlc && tlcUnjudged(tlc, evaluator),
    state: test.state,
  };
}
