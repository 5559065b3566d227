import type { Measure } from '@slighthill/shared/measures';
import { bandOf } from '../grading/band-of';
import { quantityOf } from '../grading/quantity-of';
import type { Band, GradingRule } from '../grading/types';
import { mildByLln } from '../pattern/severity-of';
import { isGraded } from '../prediction/grades-of';
import { blockingDifference, blockingKey } from './condition-words';
import { qualityCounts, stateOf, type Comparable } from './comparable';
import type { Evaluation } from './evaluator';
import { predictionReasons, stateReasons } from './reasons';
import type { TrendMeasurement, TrendPoint } from './types';

export interface PointContext {
  measure: Measure;
  rule: GradingRule | null;
  comparable: Comparable;
  /** The days of `comparable`, for looking up. */
  compared: ReadonlySet<TrendMeasurement>;
  includeLowQuality: boolean;
  gradesFev1: (sourceId: string) => boolean;
}

/** Why a result is not compared (rule TR-1), or null when it is. */
export function notComparedReason(result: TrendMeasurement, context: PointContext): string | null {
  const { measure, comparable } = context;
  if (context.compared.has(result)) return null;
  if (!qualityCounts(result.quality, context.includeLowQuality)) return `quality ${result.quality}`;
  const state = stateOf(measure, result);
  if (state !== null && state !== comparable.state) return stateReasons[state];
  if (comparable.example && blockingKey(measure, result.conditions) !== comparable.blocking)
    return blockingDifference(measure, result.conditions, comparable.example.conditions);
  return measure.sameDay === 'best' ? 'the best of the day counts' : 'the last of the day counts';
}

function bandsOfPoint(
  result: TrendMeasurement,
  evaluation: Evaluation,
  { rule, gradesFev1 }: PointContext,
): { band: Band | null; bandLabel: string | null; graded: boolean } {
  const { assessed } = evaluation;
  const gradable = {
    value: result.value,
    percentPredicted: assessed?.percentPredicted ?? null,
    z: assessed?.z ?? null,
  };
  const quantity = rule && quantityOf(rule.quantity, gradable);
  if (rule === null || quantity === null) return { band: null, bandLabel: null, graded: false };
  const band = bandOf(rule, quantity);
  const belowLln = assessed?.belowLln ?? null;
  const mild = rule.id === 'tlc-percent' && band.id === 'normal' && belowLln === true;
  const graded =
    rule.gradedWhen === 'abnormal-pattern' ? gradesFev1(result.sourceId) : isGraded(rule, quantity, belowLln);
  return { band, bandLabel: mild ? mildByLln.label : band.label, graded };
}

export function pointOf(result: TrendMeasurement, evaluation: Evaluation, context: PointContext): TrendPoint {
  const { prediction, assessed, ageYears } = evaluation;
  const { band, bandLabel, graded } = bandsOfPoint(result, evaluation, context);
  const notCompared = notComparedReason(result, context);
  const noPrediction = evaluation.reason && context.measure.referenceKind ? predictionReasons[evaluation.reason] : null;
  const reason = notCompared ?? noPrediction;
  const { pair } = context.comparable;
  const point: TrendPoint = {
    takenAt: result.takenAt,
    takenOn: result.takenOn,
    value: result.value,
    predicted: prediction?.predicted ?? null,
    percentPredicted: assessed?.percentPredicted ?? null,
    z: assessed?.z ?? null,
    lln: prediction?.lln ?? null,
    band: band?.id ?? null,
    bandLabel,
    graded,
    state: context.measure.usesBronchodilatorState ? stateOf(context.measure, result) : result.state,
    quality: result.quality,
    compared: notCompared === null,
    role: result === pair.baseline ? 'baseline' : result === pair.latest ? 'latest' : null,
    heightCm: result.heightCm,
    heightMethod: result.heightMethod,
    ageYears,
    conditions: result.conditions,
    sourceKind: result.sourceKind,
    sourceId: result.sourceId,
  };
  if (assessed?.zApproximate != null) point.zApproximate = assessed.zApproximate;
  if (result.heightCarried) point.heightCarried = true;
  if (reason !== null) point.reason = reason;
  return point;
}
