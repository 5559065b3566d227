import type { fev1SeverityRules, ratioRules, tlcSeverityRules } from '@slighthill/shared/vocabulary';

interface RuleChoice<Id extends string> {
  value: Id;
  label: string;
  hint: string;
}

/** The rules a clinic chooses between. Both ratio rules are always shown; this one decides the pattern. */
export const ratioRuleChoices: readonly RuleChoice<(typeof ratioRules)[number]>[] = [
  { value: 'fixed-ratio', label: 'Fixed ratio', hint: 'FEV1/FVC below 0.70 is obstruction' },
  { value: 'lln', label: 'LLN', hint: 'FEV1/FVC below its lower limit of normal is obstruction' },
];

export const fev1RuleChoices: readonly RuleChoice<(typeof fev1SeverityRules)[number]>[] = [
  { value: 'ats-ers-2005', label: 'ATS/ERS 2005', hint: 'By FEV1 percent predicted, five bands' },
  { value: 'ers-ats-2021', label: 'ERS/ATS 2021', hint: 'By FEV1 z-score, three bands' },
  {
    value: 'gold',
    label: 'GOLD',
    hint: 'By FEV1 percent predicted, four grades, only for confirmed COPD after bronchodilator',
  },
];

export const tlcRuleChoices: readonly RuleChoice<(typeof tlcSeverityRules)[number]>[] = [
  { value: 'tlc-percent', label: 'TLC percent predicted', hint: 'Bands at 80, 70 and 50 percent predicted' },
  { value: 'ers-ats-2021', label: 'ERS/ATS 2021', hint: 'By TLC z-score' },
];

const referenceGroupLabels: Readonly<Record<string, string>> = {
  caucasian: 'Caucasian',
  'african-american': 'African American',
  'north-east-asian': 'North East Asian',
  'south-east-asian': 'South East Asian',
  'mexican-american': 'Mexican American',
  other: 'Other or mixed',
};

/** An ancestry group as the legacy sets print it. */
export const referenceGroupLabel = (id: string): string => referenceGroupLabels[id] ?? id;
