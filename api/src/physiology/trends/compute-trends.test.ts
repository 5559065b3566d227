import { trendResponse as contract } from '@slighthill/shared/contracts/trend';
import { measureIds } from '@slighthill/shared/measures';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ageAt } from '../age-at';
import { getReferenceSet } from '../reference-sets/index';
import { computeTrends } from './compute-trends';
import { enrollment, result, spirometry, trendInput, uuidOf } from './testing/trend-input';
import type { TrendInput, TrendMeasurement, TrendOptions } from './types';

type More = Partial<Omit<TrendInput, 'measurements' | 'options'>>;
const trends = (measurements: readonly TrendMeasurement[], options: Partial<TrendOptions> = {}, more: More = {}) =>
  computeTrends(trendInput(measurements, { measures: ['fev1'], ...options }, more));

const patternOf = (measurements: readonly TrendMeasurement[], options: Partial<TrendOptions> = {}, more: More = {}) =>
  trends(measurements, options, more).pattern;

const healthy = { fev1: 3.0, fvc: 3.9 };

describe('which test decides the pattern (rule GR-0)', () => {
  it('the newest after bronchodilator of sufficient quality', () => {
    const pattern = patternOf([
      ...spirometry('2026-01-01', 1.4, 3.3),
      ...spirometry('2026-02-01', 1.3, 3.3),
      ...spirometry('2026-03-01', 1.2, 3.3, { quality: 'E' }),
      ...spirometry('2026-04-01', 1.1, 3.3, { state: 'before' }),
    ]);
    expect(pattern).toMatchObject({ provisional: false, id: 'obstruction', values: { takenOn: '2026-02-01' } });
    expect(pattern?.notes[0]).toBe('The newest test, of Apr 1, 2026, was not used: taken before bronchodilator.');
  });

  it('else the newest in another state, provisionally', () => {
    const pattern = patternOf([
      ...spirometry('2026-01-01', 1.4, 3.3, { state: 'before' }),
      ...spirometry('2026-02-01', 1.3, 3.3, { state: 'none' }),
    ]);
    expect(pattern).toMatchObject({ provisional: true, values: { takenOn: '2026-02-01', state: 'none' } });
  });

  it('none without spirometry, or where its age has no prediction', () => {
    expect(patternOf([])).toBeNull();
    const old = {
      birthDate: '1929-01-01',
      sexForPrediction: 'male',
      diagnosisGroup: 'copd',
      diagnosisConfirmed: true,
    } as const;
    expect(patternOf(spirometry('2026-01-01', 1, 2), {}, { person: old })).toBeNull();
    expect(patternOf(spirometry('2030-01-01', 1, 2), {}, { person: old })).toBeNull();
  });

  it('with the nearest TLC within 180 days; an older one counts as unknown and is named', () => {
    const test = spirometry('2026-06-30', 1.3, 2.4);
    const near = result('tlc', '2026-01-01', 7.5);
    const far = result('tlc', '2025-12-31', 7.5);
    expect(patternOf([...test, near])).toMatchObject({ id: 'obstruction', tlcMeasurementId: near.sourceId });
    const without = patternOf([...test, far]);
    expect(without).toMatchObject({ id: 'obstruction-possible-mixed', tlcMeasurementId: null });
    expect(without?.notes[0]).toContain('TLC of Dec 31, 2025 (7.50 L');
    expect(without?.notes[0]).toContain('more than 180 days');
    const nearer = result('tlc', '2026-07-10', 4);
    expect(patternOf([...test, near, nearer])).toMatchObject({ id: 'mixed', tlcMeasurementId: nearer.sourceId });
  });

  it('says of a TLC without a prediction why restriction cannot be judged', () => {
    const test = spirometry('2026-06-30', 1.3, 2.4);
    const noHeight = result('tlc', '2026-06-01', 7.5, { heightCm: null, heightMethod: null });
    const pattern = patternOf([...test, noHeight]);
    expect(pattern).toMatchObject({ id: 'obstruction-possible-mixed', tlcMeasurementId: noHeight.sourceId });
    expect(pattern?.notes).toContain(
      'TLC of Jun 1, 2026 has no predicted value (no measured height up to 12 months earlier), so restriction cannot be judged.',
    );
    expect(pattern?.notes.join(' ')).not.toContain('No TLC');
    // GLI 2021 lung volumes end at 80 years (Hall 2021, ERJ 57:2000289), the spirometry equations at 95.
    const person = {
      birthDate: '1940-01-01',
      sexForPrediction: 'male',
      diagnosisGroup: 'copd',
      diagnosisConfirmed: true,
    } as const;
    const old = patternOf([...test, result('tlc', '2026-06-01', 7.5)], {}, { person });
    expect(old?.notes).toContain(
      'TLC of Jun 1, 2026 has no predicted value (age is outside the reference set), so restriction cannot be judged.',
    );
    expect(patternOf(test)?.notes).toContain('No TLC, so restriction cannot be judged.');
  });

  it('carries the numbers it rests on', () => {
    const pattern = patternOf([...spirometry('2026-01-01', 1.32, 3.3), result('tlc', '2026-01-01', 7.5)]);
    expect(pattern?.values).toMatchObject({ ratio: 1.32 / 3.3, referenceSet: 'gli-global-2022', state: 'after' });
    expect(pattern?.values.ratioLln).toBeGreaterThan(0.6);
    expect(pattern?.values.fev1PercentPredicted).toBeGreaterThan(40);
    expect(pattern?.values.tlcPercentPredicted).toBeGreaterThan(100);
  });

  it('follows the asked ratio rule and grading rule', () => {
    const test = spirometry('2026-01-01', 1.32, 3.3);
    expect(patternOf(test, { ratioRule: 'lln' })?.ratioRule).toBe('lln');
    expect(patternOf(test, { gradingRule: 'gold' })?.severity).toMatchObject({ rule: 'gold', bandId: 'gold-3' });
    expect(patternOf(test, { gradingRule: 'ers-ats-2021' })?.severity?.rule).toBe('ers-ats-2021');
    expect(patternOf(test, { gradingRule: 'tlc-percent' })?.severity?.rule).toBe('ats-ers-2005');
    const person = { ...trendInput([], { measures: [] }).person, diagnosisConfirmed: false };
    expect(patternOf(test, { gradingRule: 'gold' }, { person })?.severity).toBeNull();
  });
});

describe('bands and grades of points (rule GR-0)', () => {
  const fev1Point = (measurements: TrendMeasurement[], options: Partial<TrendOptions> = {}, more: More = {}) =>
    trends(measurements, options, more).series[0]?.points[0];

  it('are graded only when the own pattern of the test is abnormal', () => {
    expect(fev1Point(spirometry('2026-01-01', 1.32, 3.3))).toMatchObject({ band: 'severe', graded: true });
    expect(fev1Point(spirometry('2026-01-01', healthy.fev1, healthy.fvc))).toMatchObject({
      band: 'mild',
      graded: false,
    });
  });

  it('are graded by GOLD only where GOLD applies', () => {
    const options = { gradingRule: 'gold' } as const;
    expect(fev1Point(spirometry('2026-01-01', 1.32, 3.3), options)).toMatchObject({ band: 'gold-3', graded: true });
    expect(fev1Point(spirometry('2026-01-01', 1.32, 3.3, { state: 'before' }), options)?.graded).toBe(false);
  });

  it('are always graded for scores, and never without a number', () => {
    const { series } = trends([result('cat', '2026-01-01', 22), result('phq9', '2026-01-01', 4)], {
      measures: ['cat', 'phq9', 'fvc'],
    });
    expect(series[0]).toMatchObject({ gradingRule: 'default', points: [{ band: 'high', graded: true }] });
    expect(series[1]).toMatchObject({ points: [{ band: 'minimal', graded: true }] });
    expect(series[2]).toMatchObject({ gradingRule: null, bands: [] });
  });

  it('follow the LLN for TLC (rule GR-8)', () => {
    const woman = {
      birthDate: '1986-01-01',
      sexForPrediction: 'female',
      diagnosisGroup: 'ild',
      diagnosisConfirmed: false,
    } as const;
    const person = { sex: 'female', ageYears: ageAt('1986-01-01', '2026-01-01').decimalYears, heightCm: 163 } as const;
    const { predicted } = getReferenceSet('gli-2021-lung-volumes').evaluate('tlc', person);
    const tlcAt = (part: number) =>
      trends(
        [result('tlc', '2026-01-01', predicted * part, { heightCm: 163 })],
        { measures: ['tlc'] },
        { person: woman },
      ).series[0]?.points[0];
    expect(tlcAt(0.81)).toMatchObject({ bandLabel: 'mild (LLN)', graded: true });
    expect(tlcAt(0.75)).toMatchObject({ band: 'mild', graded: true });
    expect(tlcAt(0.75)).not.toHaveProperty('bandLabel');
    expect(tlcAt(0.9)).toMatchObject({ band: 'normal', graded: false });
  });

  it('come with the limits of the rule', () => {
    const { series } = trends([], { measures: ['fev1', 'tlc', 'dlco'] });
    expect(series[0]?.bands[0]).toEqual({
      id: 'mild',
      label: 'mild',
      quantity: 'percent-predicted',
      from: 70,
      to: null,
      colorStep: 1,
    });
    expect(series[2]?.bands[1]).toMatchObject({ from: 40, to: 60, toInclusive: true });
  });
});

describe('one reference set per series, age and height of each test (rules TR-2, TR-3, TR-7)', () => {
  it('recomputes every point', () => {
    const results = [...spirometry('2026-01-01', 1.32, 3.3), ...spirometry('2027-01-01', 1.32, 3.3)];
    const [series] = trends(results).series;
    expect(series?.referenceSet).toBe('gli-global-2022');
    const [first, second] = series?.points ?? [];
    expect(first?.ageYears).toBeCloseTo(67.8, 1);
    // The same FEV1 is a larger part of what is predicted a year later.
    expect(second?.percentPredicted).toBeGreaterThan(first?.percentPredicted ?? Infinity);
    const legacy = trends(results, { referenceSet: 'gli-2012', group: 'caucasian' }).series[0];
    expect(legacy?.referenceSet).toBe('gli-2012');
    expect(legacy?.points[0]?.predicted).not.toBe(first?.predicted);
  });

  it('gives NHANES III an approximate z and notes the 20th birthday', () => {
    const person = {
      birthDate: '2006-06-01',
      sexForPrediction: 'male',
      diagnosisGroup: 'asthma',
      diagnosisConfirmed: true,
    } as const;
    const results = [...spirometry('2026-01-01', 4, 5), ...spirometry('2026-07-01', 4, 5)];
    const [series] = trends(results, { referenceSet: 'nhanes-iii-1999', group: 'caucasian' }, { person }).series;
    expect(series?.points[0]).toMatchObject({ z: null });
    expect(series?.points[0]?.zApproximate).toBeLessThan(0);
    expect(series?.notes.join(' ')).toContain('20th birthday');
  });

  it('says why points have no percent predicted', () => {
    const [fev1, walk] = trends(
      [
        ...spirometry('2026-01-01', 1.3, 3.3, { heightCm: null, heightMethod: null }),
        result('sixMinuteWalkDistance', '2026-01-01', 300, { weightKg: null }),
      ],
      { measures: ['fev1', 'sixMinuteWalkDistance'] },
    ).series;
    expect(fev1?.points[0]).toMatchObject({ percentPredicted: null, band: null, graded: false });
    expect(fev1?.notes).toContain('No percent predicted for 1 point: no measured height up to 12 months earlier.');
    expect(walk?.notes).toContain('No percent predicted for 1 point: no weight was entered with the test.');
  });

  it('has no prediction past the ages of the set or past 100', () => {
    const person = {
      birthDate: '1925-01-01',
      sexForPrediction: 'male',
      diagnosisGroup: 'copd',
      diagnosisConfirmed: true,
    } as const;
    const [series] = trends(spirometry('2026-01-01', 1, 2), {}, { person }).series;
    expect(series?.points[0]).toMatchObject({ predicted: null, reason: 'age is outside the reference set' });
  });
});

it('leaves out of a point what says nothing new, and only that', () => {
  const extras = ['role', 'bandLabel', 'heightMethod', 'heightCarried', 'conditions', 'sourceKind', 'reason'] as const;
  const cats = ['2026-01-01', '2026-02-01', '2026-03-01'].map((day) => result('cat', day, 22));
  const middle = trends(cats, { measures: ['cat'] }).series[0]?.points[1];
  for (const extra of extras) expect(middle).not.toHaveProperty(extra);
  const more = { heightMethod: 'stated', heightCarried: true, conditions: { courseM: 30 }, sourceKind: 'derived' };
  const walk = trends([result('sixMinuteWalkDistance', '2026-01-01', 300, { ...more, weightKg: null })], {
    measures: ['sixMinuteWalkDistance'],
  }).series[0]?.points[0];
  expect(walk).toMatchObject({ ...more, role: 'baseline', reason: 'no weight was entered with the test' });
});

it('keeps to the contract of the response', () => {
  const measurements = [
    ...spirometry('2026-01-01', 1.32, 3.3),
    ...spirometry('2026-01-01T13:00', 1.2, 3.1, { state: 'before' }),
    ...spirometry('2026-04-01', 1.4, 3.3),
    ...spirometry('2026-07-01', 1.41, 3.3),
    result('tlc', '2026-01-01', 7.5),
    result('cat', '2026-01-01', 22),
    result('cat', '2026-04-01', 17),
  ];
  const response = trends(measurements, { measures: measureIds }, { enrollments: [enrollment({ id: uuidOf(7) })] });
  expect(contract.parse(response)).toEqual(response);
  expect(response.enrollment).toEqual({ id: uuidOf(7), startOn: '2026-01-10', endOn: null });
  expect(response.series[0]?.ratePerYear).not.toBeNull();
});

describe('for any record', () => {
  const seed = 20261201;
  const days = fc.array(
    fc.record({
      day: fc.integer({ min: 0, max: 700 }),
      fev1: fc.integer({ min: 400, max: 3000 }),
      state: fc.constantFrom('before', 'after', 'none', 'unknown', null),
      quality: fc.constantFrom('A', 'C', 'D', 'U', 'F', null),
    }),
    { maxLength: 25 },
  );
  const inputOf = (tests: { day: number; fev1: number; state: TrendMeasurement['state']; quality: string | null }[]) =>
    tests.flatMap(({ day, fev1, state, quality }) =>
      spirometry(new Date(Date.UTC(2025, 0, 1 + day)).toISOString().slice(0, 10), fev1 / 1000, 3.3, { state, quality }),
    );

  it('baseline comes before latest, both are compared, and the change is theirs', () => {
    fc.assert(
      fc.property(days, fc.boolean(), (tests, includeLowQuality) => {
        const enrollments = [enrollment({ startOn: '2025-06-01' })];
        const [series] = trends(inputOf(tests), { includeLowQuality }, { enrollments }).series;
        if (!series) throw new Error('no series');
        const { points, baseline, latest, change } = series;
        expect(points.map((point) => point.takenAt)).toEqual(points.map((point) => point.takenAt).toSorted());
        const compared = points.filter((point) => point.compared);
        expect(new Set(compared.map((point) => point.takenOn)).size).toBe(compared.length);
        expect(new Set(compared.map((point) => point.state)).size).toBeLessThanOrEqual(1);
        for (const point of points) expect(point.compared || typeof point.reason === 'string').toBe(true);
        expect(change !== null).toBe(baseline !== null && latest !== null);
        if (baseline && latest) {
          expect(baseline.takenOn < latest.takenOn).toBe(true);
          expect(baseline.compared && latest.compared).toBe(true);
          expect(change?.absolute).toBeCloseTo(latest.value - baseline.value, 9);
          expect(latest.takenOn).toBe(compared.at(-1)?.takenOn);
        }
      }),
      { seed, numRuns: 200, verbose: true },
    );
  });
});
