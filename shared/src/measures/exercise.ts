import { defineMeasure } from './define-measure';
import type { Condition } from './types';

const meters = { unit: { symbol: 'm', ucum: 'm' }, decimals: 0, axisFrom: 0 } as const;

const oxygenLpm: Condition = {
  label: 'Oxygen during the test',
  type: 'number',
  unit: 'L/min',
  range: { min: 0, max: 60 },
  default: 0,
  onDifference: 'notes',
};

const walks: Condition = {
  label: 'Number of walks',
  type: 'number',
  range: { min: 1, max: 10 },
  whole: true,
  default: 1,
  onDifference: 'notes',
};

const courseM: Condition = {
  label: 'Course length',
  type: 'number',
  unit: 'm',
  range: { min: 5, max: 100 },
  default: 30,
  onDifference: 'blocks',
};

const aid: Condition = {
  label: 'Walking aid',
  type: 'choice',
  choices: ['none', 'cane', 'crutches', 'walker', 'rollator', 'other'],
  choiceLabels: ['None', 'Cane', 'Crutches', 'Walker', 'Rollator', 'Other'],
  default: 'none',
  onDifference: 'notes',
};

// Ranges: rules 0.7 and OM-0, set by this product.
export const sixMinuteWalkDistance = defineMeasure({
  ...meters,
  id: 'sixMinuteWalkDistance',
  label: '6-minute walk distance',
  shortLabel: '6MWD',
  group: 'exercise',
  loinc: '64098-7',
  step: 1,
  plausible: { min: 50, max: 750 },
  absolute: { min: 0, max: 1000 },
  direction: 'higher',
  importantDifference: {
    value: 30,
    source: 'Holland 2014, ERJ 44:1428; from memory, check before clinical use',
    note: 'Published range 25 to 33 m; older table 37 to 71 m (ATS/ERS 2008)',
  },
  conditions: {
    courseM,
    walks,
    oxygenLpm,
    aid,
  },
  referenceKind: 'walk',
  sameDay: 'best',
});

export const shuttleWalkDistance = defineMeasure({
  ...meters,
  id: 'shuttleWalkDistance',
  label: 'Incremental shuttle walk',
  shortLabel: 'ISWT',
  group: 'exercise',
  codeNote: 'Local code',
  step: 10,
  plausible: { min: 20, max: 800 },
  absolute: { min: 0, max: 1020 },
  direction: 'higher',
  importantDifference: {
    value: 35,
    source: 'Evans 2019 (35.0 to 36.1 m)',
    note: 'Distances go in steps of 10 m, so 40 m is needed to reach it; older value 47.5 m (Singh 2008)',
  },
  conditions: { walks, oxygenLpm, aid },
  sameDay: 'best',
});

export const enduranceShuttleWalk = defineMeasure({
  id: 'enduranceShuttleWalk',
  label: 'Endurance shuttle walk',
  shortLabel: 'ESWT',
  group: 'exercise',
  unit: { symbol: 's', ucum: 's' },
  codeNote: 'Local code',
  decimals: 0,
  step: 1,
  absolute: { min: 0, max: 1200 },
  direction: 'higher',
  importantDifference: {
    value: 186,
    source: 'Altenburg 2015 (186 to 199 s after rehabilitation, severe COPD)',
    note: 'Uncertain; 45 to 85 s published for drug trials',
  },
  conditions: {
    level: { label: 'Speed level', type: 'number', default: null, onDifference: 'blocks' },
    oxygenLpm,
    aid,
  },
  sameDay: 'best',
  axisFrom: 0,
  hint: 'Seconds walked at the set level. The test ends at 1200 s.',
});

export const sitToStandOneMinute = defineMeasure({
  id: 'sitToStandOneMinute',
  label: 'One-minute sit-to-stand',
  shortLabel: 'Sit-to-stand',
  group: 'exercise',
  unit: { symbol: 'times', ucum: '{count}' },
  codeNote: 'Local code',
  decimals: 0,
  step: 1,
  plausible: { min: 3, max: 60 },
  absolute: { min: 0, max: 80 },
  direction: 'higher',
  importantDifference: {
    value: 3,
    source: 'Vaidya 2016, Int J Chron Obstruct Pulmon Dis 11:2609; from memory, check before clinical use',
    note: 'Published as 1.9, 2.5 or 3.1 repetitions by method; three whole repetitions are used',
  },
  conditions: { oxygenLpm },
  axisFrom: 0,
});

export const spo2Nadir = defineMeasure({
  id: 'spo2Nadir',
  label: 'Lowest oxygen saturation',
  shortLabel: 'Lowest SpO2',
  group: 'exercise',
  unit: { symbol: '%', ucum: '%' },
  loinc: '59408-5',
  codeNote: 'Pulse oximetry; the lowest value of a test has no code of its own',
  decimals: 0,
  step: 1,
  plausible: { min: 70, max: 100 },
  absolute: { min: 40, max: 100 },
  direction: 'higher',
  conditions: { oxygenLpm },
  axisFrom: 70,
});
