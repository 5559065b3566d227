import { defineMeasure, score } from './define-measure';

const common = { ...score, group: 'breathlessness', direction: 'lower', patientMayEnter: true } as const;

export const mmrc = defineMeasure({
  ...common,
  id: 'mmrc',
  label: 'mMRC breathlessness grade',
  shortLabel: 'mMRC',
  unit: { symbol: 'grade', ucum: '{score}' },
  codeNote: 'No LOINC code confirmed; SNOMED CT 870179002',
  absolute: { min: 0, max: 4 },
  importantDifference: { value: 1, source: 'One grade; no paper at hand, from memory, check before clinical use' },
  hint: 'This scale runs from 0 to 4. The older MRC scale runs from 1 to 5: take one off.',
  // Our own short words for the grades, not the questionnaire's.
  gradeDescriptions: [
    'Breathless only with hard exercise',
    'Breathless when hurrying or going up a slight hill',
    'Slower than others on the level, or has to stop',
    'Stops after a few minutes on the level',
    'Too breathless to go out, or breathless when dressing',
  ],
});

/** The Borg CR10 scale has 0.5 between 0 and 1, then whole numbers. */
const borgValues = [0, 0.5, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10] as const;

const borg = {
  ...common,
  codeNote: 'Local code',
  decimals: 1,
  step: null,
  allowedValues: borgValues,
  absolute: { min: 0, max: 10 },
  importantDifference: {
    value: 1,
    source: 'One unit at equal work (Ries 2005, COPD 2:105); from memory, check before clinical use',
    note: 'Two units in the ATS/ERS 2008 outcomes table (Ries)',
  },
  conditions: {
    moment: {
      label: 'When asked',
      type: 'choice',
      choices: ['rest', 'end-of-test'],
      choiceLabels: ['At rest', 'At the end of the test'],
      default: null,
      onDifference: 'blocks',
    },
  },
  hint: 'Enter the number the person points at on the owner\u2019s printed scale.',
} as const;

export const borgDyspnea = defineMeasure({
  ...borg,
  id: 'borgDyspnea',
  label: 'Borg breathlessness',
  shortLabel: 'Borg breathlessness',
});

export const borgLegFatigue = defineMeasure({
  ...borg,
  id: 'borgLegFatigue',
  label: 'Borg leg fatigue',
  shortLabel: 'Borg legs',
});
