import type { GradingRuleId, MeasureId } from '@slighthill/shared/measures';

export type BandQuantity = 'percent-predicted' | 'z' | 'value';

/** A half-open interval, from included and to excluded, unless `toInclusive`. Null is without limit. */
export interface Band {
  id: string;
  label: string;
  from: number | null;
  to: number | null;
  /** True where the rule prints its upper limit as belonging to the band. */
  toInclusive?: true;
  /** Step of the measure's band colors, null for no color (rule GR-0). */
  colorStep: number | null;
}

/**
 * When a band is a grade and not only a place: always (scores); when the test's own pattern is abnormal (FEV1); when
 * the measure is below its LLN (TLC, rule GR-8); when it is, or at most at 60 percent (DLCO, rule GR-14).
 */
export type GradedWhen = 'always' | 'abnormal-pattern' | 'below-lln' | 'low-transfer-factor';

export interface GradingRule {
  id: GradingRuleId;
  label: string;
  source: string;
  measures: readonly MeasureId[];
  quantity: BandQuantity;
  gradedWhen: GradedWhen;
  /** From the mildest on; together they cover the whole line without gap or overlap. */
  bands: readonly Band[];
}
