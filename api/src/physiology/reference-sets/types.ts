import type { MeasureId, ReferenceKind } from '@slighthill/shared/measures';

export type Sex = 'male' | 'female';

export const referenceSetIds = [
  'gli-global-2022',
  'gli-2012',
  'nhanes-iii-1999',
  'gli-2021-lung-volumes',
  'gli-2017-transfer-factor',
  'enright-sherrill-1998',
] as const;
export type ReferenceSetId = (typeof referenceSetIds)[number];

/** The person at the test. Age is decimal years (rule 0.5); `group` only for the two legacy sets, never stored. */
export interface ReferencePerson {
  sex: Sex;
  ageYears: number;
  heightCm: number;
  weightKg?: number | null | undefined;
  group?: string | null | undefined;
}

/** Skewness, median and coefficient of variation at this sex, age and height. */
export interface Lms {
  l: number;
  m: number;
  s: number;
}

export interface Predicted {
  predicted: number;
  lln: number;
  /** Null where the set publishes no upper limit. */
  uln: number | null;
  /** Null where the set publishes no L, M, S: such a set has no z-score. */
  lms: Lms | null;
}

export interface ReferenceSet {
  id: ReferenceSetId;
  title: string;
  source: string;
  kind: ReferenceKind;
  measures: readonly MeasureId[];
  /** Ancestry groups the set prints; null where it has none. */
  groups: readonly string[] | null;
  needsWeight: boolean;
  /** Ages in years the set covers, both ends included. */
  ages: (sex: Sex) => { from: number; to: number };
  evaluate: (measure: MeasureId, person: ReferencePerson) => Predicted;
}
