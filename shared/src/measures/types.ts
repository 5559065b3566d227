import type { MeasureId } from './measure-ids';

export interface Range {
  min: number;
  max: number;
}

/** A circumstance of a test that decides whether two results may be compared. */
export interface Condition {
  label: string;
  type: 'number' | 'boolean' | 'choice';
  choices?: readonly string[];
  /** Words for the choices, in the same order. */
  choiceLabels?: readonly string[];
  unit?: string;
  /** Numbers only: outside it is refused. */
  range?: Range;
  /** Numbers only. */
  whole?: true;
  /** Used when nothing is said; null leaves the condition not stated. */
  default: number | boolean | string | null;
  /** `blocks`: results that differ are never compared. `notes`: they are, with a note. */
  onDifference: 'blocks' | 'notes';
}

export interface ImportantDifference {
  value: number;
  source: string;
  note?: string;
}

/** A change that exceeds what the test itself varies by. */
export interface VariabilityThreshold {
  value: number;
  /** Percent of the earlier value, or the measure's own unit. */
  quantity: 'percent' | 'raw';
  /** True where the source prints "more than", false where it prints "at least". */
  strict: boolean;
}

export type VariabilityInterval = 'within-a-day' | 'week-to-week' | 'year-to-year';

/** Rule GR-11: thresholds by interval between the tests and by population. */
export interface Variability {
  source: string;
  rows: Record<VariabilityInterval, { normal: VariabilityThreshold | null; copd: VariabilityThreshold | null }>;
}

/** A second, absolute yardstick shown beside the percentage, for one diagnosis group. */
export interface AbsoluteYardstick {
  value: number;
  diagnosisGroup: 'copd';
  source: string;
}

export type ReferenceKind = 'spirometry' | 'lung-volumes' | 'transfer-factor' | 'walk';
export type GradingRuleId = 'ats-ers-2005' | 'ers-ats-2021' | 'gold' | 'tlc-percent' | 'dlco-2005' | 'default';

export const measureGroups = [
  'spirometry',
  'lung-volumes',
  'transfer-factor',
  'exercise',
  'breathlessness',
  'quality-of-life',
  'mood',
  'body',
] as const;
export type MeasureGroup = (typeof measureGroups)[number];

/** An answer of a questionnaire that must be seen by itself, whatever the total. */
export interface SafetyItem {
  label: string;
  choices: readonly string[];
  /** Answers from this number on are positive. */
  positiveFrom: number;
  /** The most the other answers can add up to; with this answer it bounds the total. */
  maxOfOthers: number;
  source: string;
}

export interface Derivation {
  measures: readonly MeasureId[];
  needsHeight: boolean;
  compute: (values: Partial<Record<MeasureId, number>>, heightCm: number | null) => number | null;
}

export interface Measure {
  id: MeasureId;
  label: string;
  shortLabel: string;
  group: MeasureGroup;
  unit: { symbol: string; ucum: string };
  /** LOINC code, or null where none is confirmed; `codeNote` then says what is used. */
  loinc: string | null;
  codeNote: string | null;
  /** Decimals shown on screen. */
  decimals: number;
  /** Stored number = shown number times `perUnit`. */
  storage: { unit: string; perUnit: number };
  step: number | null;
  allowedValues: readonly number[] | null;
  /** Outside: a question. */
  plausible: Range | null;
  /** Outside: refused. */
  absolute: Range | null;
  direction: 'higher' | 'lower' | 'none';
  importantDifference: ImportantDifference | null;
  variability: Variability | null;
  absoluteYardstick: AbsoluteYardstick | null;
  conditions: Readonly<Record<string, Condition>>;
  usesBronchodilatorState: boolean;
  hasQuality: boolean;
  referenceKind: ReferenceKind | null;
  gradingRules: readonly GradingRuleId[];
  defaultGradingRule: GradingRuleId | null;
  /** `spirometry-form` and `derived` measures are never entered by themselves. */
  entry: 'single' | 'spirometry-form' | 'derived';
  /** Which of several comparable results of one day counts. */
  sameDay: 'last' | 'best';
  /** Where the y axis of a chart starts; null follows the data. */
  axisFrom: number | null;
  safetyItem: SafetyItem | null;
  derivedFrom: Derivation | null;
  patientMayEnter: boolean;
  /** Asked about when it differs from the last result by more than this many percent. */
  relativeChangeQuestion: { percent: number } | null;
  hint: string | null;
  /** Short words for whole-number grades, from the lowest. */
  gradeDescriptions: readonly string[] | null;
}
