import type { Measure } from './types';

type Required = 'id' | 'label' | 'shortLabel' | 'group' | 'unit' | 'decimals' | 'direction';

/** Fills in what most measures do not have, so that an entry says only what is particular to it. */
export function defineMeasure(entry: Pick<Measure, Required> & Partial<Omit<Measure, Required>>): Measure {
  return {
    loinc: null,
    codeNote: null,
    storage: { unit: entry.unit.ucum, perUnit: 1 },
    step: null,
    allowedValues: null,
    plausible: null,
    absolute: null,
    importantDifference: null,
    variability: null,
    absoluteYardstick: null,
    conditions: {},
    usesBronchodilatorState: false,
    hasQuality: false,
    referenceKind: null,
    gradingRules: [],
    defaultGradingRule: null,
    entry: 'single',
    sameDay: 'last',
    axisFrom: null,
    safetyItem: null,
    derivedFrom: null,
    patientMayEnter: false,
    relativeChangeQuestion: null,
    hint: null,
    gradeDescriptions: null,
    ...entry,
  };
}

/** Volumes are shown in liters and stored as whole milliliters. */
export const volume = {
  unit: { symbol: 'L', ucum: 'L' },
  storage: { unit: 'mL', perUnit: 1000 },
  decimals: 2,
  axisFrom: 0,
} as const;

export const score = { unit: { symbol: '', ucum: '{score}' }, decimals: 0, step: 1, axisFrom: 0 } as const;
