import { obstructivePatterns, type PatternId } from './pattern-of';

export type RatioRule = 'fixed-ratio' | 'lln';

/** Rule GR-0. */
export const patternLabels: Record<PatternId, string> = {
  normal: 'Normal',
  obstruction: 'Obstructive',
  'obstruction-fev1-normal': 'Obstructive',
  'obstruction-possible-mixed': 'Obstructive, restriction not excluded',
  mixed: 'Mixed',
  restriction: 'Restrictive',
  'non-specific': 'Non-specific',
  'possible-restriction': 'Restriction suggested, needs TLC',
  'fev1-low-only': 'Low FEV1, ratio normal',
};

const ruleNames: Record<RatioRule, string> = { 'fixed-ratio': 'fixed ratio', lln: 'LLN' };

export interface HeadingInputs {
  id: PatternId;
  ratioRule: RatioRule;
  /** The pattern the other ratio rule would give. */
  otherId: PatternId;
  rulesAgree: boolean;
  severityLabel: string | null;
}

const withPattern: readonly PatternId[] = [...obstructivePatterns.slice(0, 2), 'mixed', 'restriction', 'non-specific'];

/**
 * The words over a test (rule GR-0). When the two ratio rules disagree the heading says so, e.g.
 * "Obstructive by fixed ratio, not by LLN"; otherwise it carries the severity.
 */
export function patternHeading({ id, ratioRule, otherId, rulesAgree, severityLabel }: HeadingInputs): string {
  const label = patternLabels[id];
  if (!rulesAgree) return disagreement(id, ratioRule, otherId);
  const name = withPattern.includes(id) ? `${label} pattern` : label;
  return severityLabel ? `${name}, ${severityLabel}` : name;
}

function disagreement(id: PatternId, ratioRule: RatioRule, otherId: PatternId): string {
  const chosen = ruleNames[ratioRule];
  const other = ruleNames[ratioRule === 'lln' ? 'fixed-ratio' : 'lln'];
  const [name = '', ...rest] = patternLabels[id].split(', ');
  if (id === 'mixed' || obstructivePatterns.includes(id))
    return [`${name} by ${chosen}, not by ${other}`, ...rest].join(', ');
  return `${name} by ${chosen}, ${(patternLabels[otherId].split(', ')[0] ?? '').toLowerCase()} by ${other}`;
}
