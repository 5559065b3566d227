/** The closed lists of words the API and the web share, kept apart from the schemas: the web's first load has no schemas. */

export const diagnosisGroups = [
  'copd',
  'ild',
  'asthma',
  'bronchiectasis',
  'post-covid',
  'pulmonary-hypertension',
  'surgery-or-transplant',
  'other',
] as const;
export type DiagnosisGroup = (typeof diagnosisGroups)[number];

export const diagnosisGroupLabels: Record<DiagnosisGroup, string> = {
  copd: 'COPD',
  ild: 'ILD',
  asthma: 'Asthma',
  bronchiectasis: 'Bronchiectasis',
  'post-covid': 'Post-COVID',
  'pulmonary-hypertension': 'Pulmonary hypertension',
  'surgery-or-transplant': 'Surgery or transplant',
  other: 'Other',
};

export const sexesForPrediction = ['male', 'female'] as const;
export type SexForPrediction = (typeof sexesForPrediction)[number];

export const enrollmentStatuses = [
  'planned',
  'active',
  'paused',
  'completed',
  'partly-completed',
  'withdrawn',
] as const;
export type EnrollmentStatus = (typeof enrollmentStatuses)[number];
export const openEnrollmentStatuses = ['planned', 'active', 'paused'] as const;

export const ratioRules = ['fixed-ratio', 'lln'] as const;
export const fev1SeverityRules = ['ats-ers-2005', 'ers-ats-2021', 'gold'] as const;
export const tlcSeverityRules = ['tlc-percent', 'ers-ats-2021'] as const;
export const gradingRuleIds = ['ats-ers-2005', 'ers-ats-2021', 'gold', 'tlc-percent', 'dlco-2005', 'default'] as const;

/** Sets a caller may name; the walk has one set of its own, which is always used for it. */
export const referenceSetIds = [
  'gli-global-2022',
  'gli-2012',
  'nhanes-iii-1999',
  'gli-2021-lung-volumes',
  'gli-2017-transfer-factor',
] as const;
export type ReferenceSetId = (typeof referenceSetIds)[number];

/** Ancestry groups printed in the two legacy sets; asked each time, never stored on a patient. */
export const referenceGroups = {
  'gli-2012': ['caucasian', 'african-american', 'north-east-asian', 'south-east-asian', 'other'],
  'nhanes-iii-1999': ['caucasian', 'african-american', 'mexican-american'],
} as const;

export const bronchodilatorStates = ['before', 'after', 'none', 'unknown'] as const;
export type BronchodilatorState = (typeof bronchodilatorStates)[number];
