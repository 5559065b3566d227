export const patternIds = [
  'normal',
  'obstruction',
  'obstruction-fev1-normal',
  'obstruction-possible-mixed',
  'mixed',
  'restriction',
  'non-specific',
  'possible-restriction',
  'fev1-low-only',
] as const;
export type PatternId = (typeof patternIds)[number];

export interface PatternInputs {
  /** By the chosen ratio rule. */
  ratioLow: boolean;
  fvcLow: boolean;
  fev1Low: boolean;
  /** Null without a TLC; restriction is never named then. */
  tlcLow: boolean | null;
}

/**
 * Pattern of a test (rule GR-5; ERS/ATS 2021, Stanojevic 2022, ERJ 60:2101499, logic from memory). Each input says
 * whether the value is below its lower limit of normal; the ratio follows the chosen ratio rule.
 * @example patternOf({ ratioLow: true, fvcLow: true, fev1Low: true, tlcLow: null }) // obstruction-possible-mixed
 */
export function patternOf({ ratioLow, fvcLow, fev1Low, tlcLow }: PatternInputs): PatternId {
  if (ratioLow) {
    if (tlcLow === true) return 'mixed';
    if (tlcLow === null && fvcLow) return 'obstruction-possible-mixed';
    return fev1Low ? 'obstruction' : 'obstruction-fev1-normal';
  }
  if (tlcLow === true) return 'restriction';
  if (tlcLow === false) return fvcLow || fev1Low ? 'non-specific' : 'normal';
  if (fvcLow) return 'possible-restriction';
  return fev1Low ? 'fev1-low-only' : 'normal';
}

export const obstructivePatterns: readonly PatternId[] = [
  'obstruction',
  'obstruction-fev1-normal',
  'obstruction-possible-mixed',
];
