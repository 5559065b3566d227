import { defineMeasure, score } from './define-measure';

// Licensed questionnaires: totals only, their wording is never stored or shown.
const fromForm = 'Enter the total from the owner\u2019s form.';
const common = { ...score, group: 'quality-of-life', codeNote: 'Local code' } as const;

export const cat = defineMeasure({
  ...common,
  id: 'cat',
  label: 'COPD Assessment Test',
  shortLabel: 'CAT',
  absolute: { min: 0, max: 40 },
  direction: 'lower',
  importantDifference: {
    value: 2,
    source: 'Kon 2014, Lancet Respir Med 2:195; from memory, check before clinical use',
  },
  gradingRules: ['default'],
  defaultGradingRule: 'default',
  patientMayEnter: true,
  hint: fromForm,
});

export const sgrq = defineMeasure({
  ...common,
  id: 'sgrq',
  label: 'St George\u2019s Respiratory Questionnaire, total',
  shortLabel: 'SGRQ',
  decimals: 1,
  step: null,
  absolute: { min: 0, max: 100 },
  direction: 'lower',
  importantDifference: { value: 4, source: 'ATS/ERS 2008 outcomes table' },
  hint: fromForm,
});

/** Each domain is the mean of its items, 1 to 7. */
const crq = {
  ...common,
  decimals: 2,
  step: null,
  absolute: { min: 1, max: 7 },
  axisFrom: 1,
  direction: 'higher',
  importantDifference: { value: 0.5, source: 'ATS/ERS 2008 outcomes table, per item mean' },
  hint: 'Enter the mean per item, 1 to 7, from the owner\u2019s form.',
} as const;

export const crqDyspnea = defineMeasure({ ...crq, id: 'crqDyspnea', label: 'CRQ dyspnea', shortLabel: 'CRQ dyspnea' });
export const crqFatigue = defineMeasure({ ...crq, id: 'crqFatigue', label: 'CRQ fatigue', shortLabel: 'CRQ fatigue' });
export const crqEmotion = defineMeasure({ ...crq, id: 'crqEmotion', label: 'CRQ emotion', shortLabel: 'CRQ emotion' });
export const crqMastery = defineMeasure({ ...crq, id: 'crqMastery', label: 'CRQ mastery', shortLabel: 'CRQ mastery' });
