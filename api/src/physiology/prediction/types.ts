import type { GradingRuleId, MeasureId } from '@slighthill/shared/measures';
import type { QuantifiedBand } from '../grading/bands-of';
import type { ClinicSeverityRules } from '../grading/index';
import type { BronchodilatorState, JudgedPattern } from '../pattern/judge-pattern';
import type { RatioRule } from '../pattern/pattern-words';
import type { NotPredictable } from '../reference-sets/predict';
import type { ReferenceSetId, Sex } from '../reference-sets/types';
import type { InputError } from './check-group';

export interface Grade {
  rule: GradingRuleId;
  measure: MeasureId;
  bandId: string;
  label: string;
}

export interface PredictionRequest {
  referenceSet: ReferenceSetId;
  sex: Sex;
  ageYears: number;
  heightCm: number;
  weightKg?: number | undefined;
  group?: string | undefined;
  bronchodilator?: BronchodilatorState | undefined;
  diagnosisGroup?: string | undefined;
  diagnosisConfirmed?: boolean | undefined;
  ratioRule?: RatioRule | undefined;
  gradingRule?: GradingRuleId | undefined;
  /** In display units: volumes L, ratio a fraction, RV/TLC percent. */
  values: Partial<Record<MeasureId, number>>;
}

export interface PredictionDefaults extends ClinicSeverityRules {
  ratioRule: RatioRule;
}

export interface PredictedMeasure {
  referenceSet: ReferenceSetId | null;
  predicted: number | null;
  lln: number | null;
  uln: number | null;
  value: number | null;
  percentPredicted: number | null;
  z: number | null;
  zApproximate?: number;
  reason?: NotPredictable;
}

export interface PredictionResponse {
  referenceSet: ReferenceSetId;
  measures: Partial<Record<MeasureId, PredictedMeasure>>;
  pattern: (JudgedPattern & { spirometryTestId: null; tlcMeasurementId: null }) | null;
  grades: Grade[];
  /** Of every value given that has a grading rule. */
  bands: Partial<Record<MeasureId, readonly QuantifiedBand[]>>;
  notes: string[];
}

export type PredictionOutcome = { ok: true; response: PredictionResponse } | { ok: false; errors: InputError[] };

/** Judged measures with the side of the LLN they lie on, which the response itself does not carry. */
export type JudgedMeasures = Partial<
  Record<MeasureId, PredictedMeasure & { belowLln: boolean | null; aboveUln: boolean | null }>
>;
