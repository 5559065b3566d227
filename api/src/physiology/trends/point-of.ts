import type { Measure } from '@slighthill/shared/measures';
import { bandOf } from '../grading/band-of';
import { quantityOf } from '../grading/quantity-of';
import type { GradingRule } from '../grading/types';
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

/** Sets band and grade on a point, where the rule has a number to look at. */
function grade(point: TrendPoint, belowLln: boolean | null, { rule, gradesFev1 }: PointContext): void {
  const quantity = rule && quantityOf(rule.quantity, point);
  if (rule === null || quantity === null) return;
  const band = bandOf(rule, quantity);
  point.band = band.id;
  if (rule.id === 'tlc-percent' && band.id === 'normal' && belowLln === true) point.bandLabel = mildByLln.label;
  point.graded =
    rule.gradedWhen === 'abnormal-pattern' ? gradesFev1(point.sourceId) : isGraded(rule, quantity, belowLln);
}

function hasAny(conditions: TrendMeasurement['conditions']): boolean {
  for (const _key in conditions) return true;
  return false;
}

export function pointOf(result: TrendMeasurement, evaluation: Evaluation, context: PointContext): TrendPoint {
  const { prediction, assessed, ageYears } = evaluation;
  const notCompared = notComparedReason(result, context);
  const point: TrendPoint = {
    takenAt: result.takenAt,
    takenOn: result.takenOn,
    value: result.value,
    predicted: prediction?.predicted ?? null,
    percentPredicted: assessed?.percentPredicted ?? null,
    z: assessed?.z ?? null,
    lln: prediction?.lln ?? null,
    band: null,
    graded: false,
    state: context.measure.usesBronchodilatorState ? stateOf(context.measure, result) : result.state,
    quality: result.quality,
    compared: notCompared === null,
    heightCm: result.heightCm,
    ageYears,
    sourceId: result.sourceId,
  };
  grade(point, assessed?.belowLln ?? null, context);
  addExtras(point, result, context);
  if (assessed?.zApproximate != null) point.zApproximate = assessed.zApproximate;
  const noPrediction = evaluation.reason && context.measure.referenceKind ? predictionReasons[evaluation.reason] : null;
  const reason = notCompared ?? noPrediction;
  if (reason !== null) point.reason = reason;
  return point;
}

/** Only what says something new is written to a point; a field set to undefined would cost as much as a number. */
function addExtras(point: TrendPoint, result: TrendMeasurement, { comparable }: PointContext): void {
  const { baseline, latest } = comparable.pair;
  if (result === baseline) point.role = 'baseline';
  else if (result === latest) point.role = 'latest';
  if (result.heightMethod !== null && result.heightMethod !== 'measured') point.heightMethod = result.heightMethod;
  if (result.heightCarried) point.heightCarried = true;
  if (hasAny(result.conditions)) point.conditions = result.conditions;
  if (result.sourceKind !== 'measurement') point.sourceKind = result.sourceKind;
}
