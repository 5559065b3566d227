import type { fev1SeverityRules, ratioRules, tlcSeverityRules } from '@slighthill/shared/contracts/clinic';
import type { RadioChoice } from '../../ui/radio-group';

/** The rules a clinic chooses between. Both ratio rules are always shown; this one decides the pattern. */
export const ratioChoices: RadioChoice<(typeof ratioRules)[number]>[] = [
  { value: 'fixed-ratio', label: 'Fixed ratio', hint: 'FEV1/FVC below 0.70 is obstruction' },
  { value: 'lln', label: 'LLN', hint: 'FEV1/FVC below its lower limit of normal is obstruction' },
];

export const fev1Choices: RadioChoice<(typeof fev1SeverityRules)[number]>[] = [
  { value: 'ats-ers-2005', label: 'ATS/ERS 2005', hint: 'By FEV1 percent predicted, five bands' },
  { value: 'ers-ats-2021', label: 'ERS/ATS 2021', hint: 'By FEV1 z-score, three bands' },
  { value: 'gold', label: 'GOLD', hint: 'By FEV1 percent predicted after bronchodilator, four grades' },
];

export const tlcChoices: RadioChoice<(typeof tlcSeverityRules)[number]>[] = [
  { value: 'tlc-percent', label: 'TLC percent predicted', hint: 'Bands at 80, 70 and 50 percent predicted' },
  { value: 'ers-ats-2021', label: 'ERS/ATS 2021', hint: 'By TLC z-score' },
];
