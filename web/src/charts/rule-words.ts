import { fev1RuleChoices, tlcRuleChoices } from '../lib/rule-words';

/** Names of reference sets and rules as screens print them. */
export const referenceSetLabels: Readonly<Record<string, string>> = {
  'gli-global-2022': 'GLI Global 2022',
  'gli-2012': 'GLI 2012',
  'nhanes-iii-1999': 'NHANES III 1999',
  'gli-2021-lung-volumes': 'GLI 2021 lung volumes',
  'gli-2017-transfer-factor': 'GLI 2017 transfer factor',
  'enright-sherrill-1998': 'Enright and Sherrill 1998',
};

export const gradingRuleLabels: Readonly<Record<string, string>> = {
  ...Object.fromEntries([...tlcRuleChoices, ...fev1RuleChoices].map(({ value, label }) => [value, label])),
  'dlco-2005': 'ATS/ERS 2005 for transfer factor',
  default: 'the score’s own bands',
};

export const referenceSetLabel = (id: string): string => referenceSetLabels[id] ?? id;
export const gradingRuleLabel = (id: string): string => gradingRuleLabels[id] ?? id;

export const stateWords = {
  before: 'before bronchodilator',
  after: 'after bronchodilator',
  none: 'no bronchodilator given',
  unknown: 'bronchodilator not stated',
} as const;

export const capitalize = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
