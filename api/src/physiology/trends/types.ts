import type { GradingRuleId, MeasureId } from '@slighthill/shared/measures';
import type { Band, BandQuantity } from '../grading/types';
import type { BronchodilatorState, JudgedPattern } from '../pattern/judge-pattern';
import type { RatioRule } from '../pattern/pattern-words';
import type { ReferenceSetId, Sex } from '../reference-sets/types';

export interface TrendPerson {
  birthDate: string;
  sexForPrediction: Sex;
  diagnosisGroup: string;
  diagnosisConfirmed: boolean;
}

/** One current result. Dates are those of the clinic's calendar. */
export interface TrendMeasurement {
  id: string;
  measure: MeasureId;
  takenAt: string;
  takenOn: string;
  /** In the registry's display unit. */
  value: number;
  state: BronchodilatorState | null;
  conditions: Readonly<Record<string, unknown>>;
  /** Null: not graded. */
  quality: string | null;
  heightCm: number | null;
  heightMethod: string | null;
  heightCarried: boolean;
  weightKg: number | null;
  sourceKind: string;
  sourceId: string;
}

export interface TrendEnrollment {
  id: string;
  status: string;
  startOn: string;
  firstExerciseOn: string | null;
  lastSessionOn: string | null;
  endOn: string | null;
}

export interface TrendClinic {
  ratioRule: RatioRule;
  fev1SeverityRule: GradingRuleId;
  tlcSeverityRule: GradingRuleId;
  tlcWindowDays: number;
}

export interface TrendOptions {
  measures: readonly MeasureId[];
  referenceSet?: ReferenceSetId | undefined;
  gradingRule?: GradingRuleId | undefined;
  ratioRule?: RatioRule | undefined;
  group?: string | undefined;
  state?: BronchodilatorState | undefined;
  enrollment?: string | undefined;
  includeLowQuality?: boolean | undefined;
}

export interface TrendInput {
  person: TrendPerson;
  /** Oldest first: every current result of the asked measures and of FEV1, FVC, FEV1/FVC and TLC. */
  measurements: readonly TrendMeasurement[];
  enrollments: readonly TrendEnrollment[];
  exacerbationOnsets: readonly string[];
  clinic: TrendClinic;
  options: TrendOptions;
}

/** What may be absent is left out where it says nothing new: a long record is mostly such points. */
export interface TrendPoint {
  takenAt: string;
  takenOn: string;
  value: number;
  predicted: number | null;
  percentPredicted: number | null;
  z: number | null;
  zApproximate?: number;
  lln: number | null;
  band: string | null;
  /** Only where it differs from the label of the band. */
  bandLabel?: string;
  graded: boolean;
  state: BronchodilatorState | null;
  quality: string | null;
  compared: boolean;
  role?: 'baseline' | 'latest';
  /** Why the point is not compared, or why it has no prediction. */
  reason?: string;
  heightCm: number | null;
  /** Only where it was not measured. */
  heightMethod?: string;
  /** Only where the height is that of an earlier visit. */
  heightCarried?: true;
  ageYears: number;
  /** Only where any were recorded. */
  conditions?: Readonly<Record<string, unknown>>;
  /** Only where it is no measurement entered by itself. */
  sourceKind?: string;
  sourceId: string;
}

export type Verdict = 'better' | 'worse' | 'within-variation' | 'not-judged';

export interface Yardstick {
  id: 'important-difference' | 'test-variability' | 'copd-between-sessions';
  label: string;
  threshold: number;
  unit: string;
  reached: boolean;
}

export interface TrendChange {
  absolute: number;
  relativePercent: number | null;
  verdict: Verdict;
  yardsticks: Yardstick[];
}

export interface TrendRate {
  value: number;
  low: number;
  high: number;
}

export interface TrendSeries {
  measure: MeasureId;
  unit: string;
  referenceSet: ReferenceSetId | null;
  gradingRule: GradingRuleId | null;
  /** The state compared (rule TR-1 d); null for measures without one. */
  state: BronchodilatorState | null;
  bands: readonly (Band & { quantity: BandQuantity })[];
  points: TrendPoint[];
  baseline: TrendPoint | null;
  latest: TrendPoint | null;
  change: TrendChange | null;
  /** The largest threshold that applies, in the raw unit: what is drawn as too small to count. */
  zone: number | null;
  ratePerYear: TrendRate | null;
  /** The same for percent predicted, in percentage points (rule TR-5); null without predictions. */
  percentPredictedRatePerYear: TrendRate | null;
  notes: string[];
}

export interface TrendPattern extends JudgedPattern {
  spirometryTestId: string;
  tlcMeasurementId: string | null;
  values: {
    takenOn: string;
    state: BronchodilatorState;
    referenceSet: ReferenceSetId;
    ratio: number | null;
    ratioLln: number | null;
    fev1PercentPredicted: number | null;
    tlcPercentPredicted: number | null;
  };
}

export interface TrendResponse {
  pattern: TrendPattern | null;
  enrollment: { id: string; startOn: string; endOn: string | null } | null;
  series: TrendSeries[];
}
