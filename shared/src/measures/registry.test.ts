import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  checkValue,
  fromStored,
  getMeasure,
  isMeasureId,
  measureGroups,
  measureIds,
  measures,
  questionHeight,
  toStored,
  type MeasureId,
} from './registry';

describe('the measure registry', () => {
  it('has every measure once, under its own id', () => {
    expect(measureIds).toHaveLength(36);
    expect(new Set(measureIds).size).toBe(36);
    for (const id of measureIds) expect(getMeasure(id).id).toBe(id);
    expect(measures.map((measure) => measure.id)).toEqual([...measureIds]);
    expect(isMeasureId('fev1')).toBe(true);
    expect(isMeasureId('toString')).toBe(false);
  });

  it.each(measures.map((measure) => [measure.id, measure] as const))('%s is complete and consistent', (_, measure) => {
    expect(measure.label).not.toBe('');
    expect(measureGroups).toContain(measure.group);
    expect(measure.loinc ?? measure.codeNote).not.toBeNull();
    if (measure.plausible && measure.absolute) {
      expect(measure.plausible.min).toBeGreaterThanOrEqual(measure.absolute.min);
      expect(measure.plausible.max).toBeLessThanOrEqual(measure.absolute.max);
    }
    if (measure.defaultGradingRule) expect(measure.gradingRules).toContain(measure.defaultGradingRule);
    if (measure.importantDifference) {
      expect(measure.importantDifference.value).toBeGreaterThan(0);
      expect(measure.importantDifference.source).not.toBe('');
      expect(measure.direction).not.toBe('none');
    }
    for (const condition of Object.values(measure.conditions)) {
      if (condition.type === 'choice') expect(condition.choiceLabels).toHaveLength(condition.choices?.length ?? 0);
      if (condition.default !== null && condition.choices) expect(condition.choices).toContain(condition.default);
      if (condition.range && typeof condition.default === 'number') {
        expect(condition.default).toBeGreaterThanOrEqual(condition.range.min);
        expect(condition.default).toBeLessThanOrEqual(condition.range.max);
      }
    }
    if (measure.entry === 'single' || measure.entry === 'spirometry-form') expect(measure.absolute).not.toBeNull();
  });

  it('keeps measures of a test form and derived ones out of single entry', () => {
    const others = measures.filter((measure) => measure.entry !== 'single').map((measure) => measure.id);
    expect(others).toEqual(['fev1', 'fvc', 'fev1fvc', 'pef', 'fef2575', 'rvtlc', 'bmi', 'bode']);
  });
});

// Important differences: rule OM-0, which names the papers.
const differences: [MeasureId, number | null, 'higher' | 'lower' | 'none'][] = [
  ['fev1', 0.1, 'higher'],
  ['fvc', null, 'higher'],
  ['fev1fvc', null, 'higher'],
  ['sixMinuteWalkDistance', 30, 'higher'],
  ['shuttleWalkDistance', 35, 'higher'],
  ['enduranceShuttleWalk', 186, 'higher'],
  ['sitToStandOneMinute', 3, 'higher'],
  ['mmrc', 1, 'lower'],
  ['cat', 2, 'lower'],
  ['borgDyspnea', 1, 'lower'],
  ['borgLegFatigue', 1, 'lower'],
  ['sgrq', 4, 'lower'],
  ['crqDyspnea', 0.5, 'higher'],
  ['crqMastery', 0.5, 'higher'],
  ['hadsAnxiety', 1.5, 'lower'],
  ['hadsDepression', 1.5, 'lower'],
  ['phq9', 5, 'lower'],
  ['gad7', 4, 'lower'],
  ['weight', null, 'none'],
];

it.each(differences)('%s has the important difference of rule OM-0', (id, value, direction) => {
  expect(getMeasure(id).importantDifference?.value ?? null).toBe(value);
  expect(getMeasure(id).direction).toBe(direction);
});

// Pellegrino 2005, table 12 (rule GR-11): [measure, interval, normal, COPD].
it.each([
  ['fev1', 'within-a-day', 5, 13],
  ['fev1', 'week-to-week', 12, 20],
  ['fev1', 'year-to-year', 15, 15],
  ['fvc', 'within-a-day', 5, 11],
  ['fvc', 'week-to-week', 11, 20],
  ['fvc', 'year-to-year', 15, 15],
  ['fef2575', 'within-a-day', 13, 23],
  ['fef2575', 'week-to-week', 21, 30],
  ['fef2575', 'year-to-year', null, null],
  ['dlco', 'within-a-day', 7, null],
  ['dlco', 'week-to-week', 6, 4],
  ['dlco', 'year-to-year', 10, 10],
] as const)('%s varies %s by the published amount', (id, interval, normal, copd) => {
  const row = getMeasure(id).variability?.rows[interval];
  expect(row?.normal?.value ?? null).toBe(normal);
  expect(row?.copd?.value ?? null).toBe(copd);
});

describe('checkValue', () => {
  // Rule 0.7: plausible and absolute ranges; OM-0: steps of scores.
  it.each([
    ['fev1', 1.32, null],
    ['fev1', 0.1, 'question'],
    ['fev1', 0.3, null],
    ['fev1', 6.01, 'question'],
    ['fev1', 8.01, 'absolute'],
    ['fev1', -1, 'absolute'],
    ['fvc', 0.59, 'question'],
    ['tlc', 14.1, 'absolute'],
    ['sixMinuteWalkDistance', 49, 'question'],
    ['sixMinuteWalkDistance', 1001, 'absolute'],
    ['sixMinuteWalkDistance', 310.5, 'step'],
    ['shuttleWalkDistance', 185, 'step'],
    ['shuttleWalkDistance', 180, null],
    ['mmrc', 5, 'absolute'],
    ['mmrc', 1.5, 'step'],
    ['cat', 41, 'absolute'],
    ['borgDyspnea', 0.5, null],
    ['borgDyspnea', 1.5, 'step'],
    ['sgrq', 55.3, null],
    ['crqDyspnea', 0.9, 'absolute'],
    ['phq9', 27, null],
    ['phq9', 28, 'absolute'],
    ['spo2Nadir', 69, 'question'],
    ['weight', 19.9, 'absolute'],
    ['weight', 34, 'question'],
    ['fev1', Number.NaN, 'not-a-number'],
  ] as const)('%s of %d gives %s', (id, value, expected) => {
    const found = checkValue(id, value);
    const kind = found === null ? null : 'question' in found ? 'question' : found.problem;
    expect(kind).toBe(expected);
  });

  it('speaks in the words of the form', () => {
    expect(checkValue('fev1', 9)).toEqual({ problem: 'absolute', message: 'FEV1 must be 0.10 to 8.00 L' });
    expect(checkValue('mmrc', 5)).toEqual({
      problem: 'absolute',
      message: 'mMRC breathlessness grade must be 0 to 4',
    });
    expect(checkValue('fev1', 6.5)).toEqual({
      question: '6.50 L is outside the usual 0.30 to 6.00 L. Is it right?',
    });
  });
});

it('stores volumes as whole milliliters and gives the same number back', () => {
  expect(toStored('fev1', 1.32)).toBe(1320);
  expect(toStored('fvc', 4.15)).toBe(4150);
  expect(toStored('cat', 22)).toBe(22);
  const seed = 20250930;
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 14_000 }), (ml) => toStored('tlc', fromStored('tlc', ml)) === ml),
    { seed, verbose: true },
  );
});

describe('derived measures', () => {
  it('works out FEV1/FVC, RV/TLC and BMI', () => {
    const compute = (id: MeasureId) => getMeasure(id).derivedFrom?.compute;
    expect(compute('fev1fvc')?.({ fev1: 1.32, fvc: 2.78 }, null)).toBeCloseTo(0.47482, 6); // rule SP-1
    expect(compute('rvtlc')?.({ rv: 3.6, tlc: 7.4 }, null)).toBeCloseTo(48.6, 1); // rule LV-1
    expect(compute('bmi')?.({ weight: 78 }, null)).toBeNull();
  });
});

// Rule OM-4.
it.each([
  [78, 172, 26.3656],
  [53.8, 160, 21.0156],
  [53.76, 160, 21],
  [95, 168, 33.6593],
])('BMI of %d kg and %d cm', (weight, heightCm, expected) => {
  expect(getMeasure('bmi').derivedFrom?.compute({ weight }, heightCm)).toBeCloseTo(expected, 4);
});

// Rule 0.7: plausible and absolute ranges, in display units.
it.each([
  ['fev1', [0.3, 6], [0.1, 8]],
  ['fvc', [0.6, 8], [0.2, 10]],
  ['pef', [0.8, 14], [0.2, 20]],
  ['fef2575', [0.1, 8], [0.03, 12]],
  ['tlc', [2, 11], [1, 14]],
  ['rv', [0.5, 6], [0.2, 10]],
  ['frc', [1, 8], [0.4, 12]],
  ['ic', [0.5, 7], [0.2, 10]],
  ['vc', [0.5, 7], [0.2, 10]],
  ['erv', [0.1, 3], [0, 5]],
  ['rvtlc', [15, 80], [5, 95]],
  ['dlco', [3, 45], [0.5, 70]],
  ['kco', [1, 8], [0.2, 12]],
  ['va', [1.5, 10], [0.5, 14]],
  ['spo2Nadir', [70, 100], [40, 100]],
  ['weight', [35, 180], [20, 350]],
  ['sixMinuteWalkDistance', [50, 750], [0, 1000]],
  ['shuttleWalkDistance', [20, 800], [0, 1020]],
  ['sitToStandOneMinute', [3, 60], [0, 80]],
] as const)('%s has the ranges of rule 0.7', (id, plausible, absolute) => {
  expect(getMeasure(id).plausible).toEqual({ min: plausible[0], max: plausible[1] });
  expect(getMeasure(id).absolute).toEqual({ min: absolute[0], max: absolute[1] });
});

// Rule 0.6.
it.each([
  [65, 'inches', 165.1],
  [48, 'inches', 121.9],
  [84, 'inches', 213.4],
  [1.65, 'meters', 165],
  [85, null, null],
  [172, null, null],
] as const)('a height of %d looks like %s', (height, unit, cm) => {
  expect(questionHeight(height)?.looksLike ?? null).toBe(unit);
  expect(questionHeight(height)?.suggestionCm ?? null).toBe(cm);
});
