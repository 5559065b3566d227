import type { MeasureId } from '@slighthill/shared/measures';
import { describe, expect, it } from 'vitest';
import { computeTrends } from './compute-trends';
import { enrollment, result, spirometry, trendInput } from './testing/trend-input';
import type { TrendInput, TrendMeasurement, TrendOptions, TrendSeries } from './types';

/** The only series of a computation. */
function series(
  measure: MeasureId,
  measurements: readonly TrendMeasurement[],
  options: Partial<TrendOptions> = {},
  more: Partial<Omit<TrendInput, 'measurements' | 'options'>> = {},
): TrendSeries {
  const [only] = computeTrends(trendInput(measurements, { measures: [measure], ...options }, more)).series;
  if (!only) throw new Error('no series');
  return only;
}

const compared = (found: TrendSeries) => found.points.filter((point) => point.compared).map((point) => point.takenOn);
const pair = (found: TrendSeries) => [found.baseline?.takenOn ?? null, found.latest?.takenOn ?? null];
const walk = (when: string, value: number, conditions = {}) =>
  result('sixMinuteWalkDistance', when, value, { conditions });

describe('TR-1 (a) points', () => {
  it('are all current results, oldest first', () => {
    const found = series('cat', [result('cat', '2026-03-01', 20), result('cat', '2026-01-01', 24)]);
    expect(found.points.map((point) => point.value)).toEqual([24, 20]);
  });

  it('are none where nothing was recorded', () => {
    const found = series('cat', []);
    expect(found).toMatchObject({ points: [], baseline: null, latest: null, change: null, ratePerYear: null });
    expect(found.notes).toEqual([]);
  });
});

describe('TR-1 (b) comparable', () => {
  it('needs the same bronchodilator state', () => {
    const found = series('fev1', [
      ...spirometry('2026-01-01', 1.3, 2.8),
      ...spirometry('2026-02-01', 1.2, 2.7, { state: 'before' }),
      ...spirometry('2026-03-01', 1.2, 2.7, { state: null }),
      ...spirometry('2026-04-01', 1.4, 2.9),
    ]);
    expect(compared(found)).toEqual(['2026-01-01', '2026-04-01']);
    expect(found.points[1]?.reason).toBe('taken before bronchodilator');
    expect(found.points[2]).toMatchObject({ state: 'unknown', reason: 'bronchodilator not stated' });
    expect(found.notes).toContain('1 point not compared: taken before bronchodilator.');
  });

  it.each([
    ['sixMinuteWalkDistance', { courseM: 20 }, 'course length 20 m instead of 30 m'],
    ['tlc', { method: 'helium' }, 'method helium dilution instead of not stated'],
    ['dlco', { hemoglobinCorrected: true }, 'corrected for hemoglobin yes instead of no'],
  ] as const)('needs the same blocking conditions: %s', (measure, conditions, reason) => {
    const value = measure === 'sixMinuteWalkDistance' ? 300 : 5;
    const found = series(measure, [
      result(measure, '2026-01-01', value),
      result(measure, '2026-02-01', value, { conditions }),
      result(measure, '2026-03-01', value),
    ]);
    expect(compared(found)).toEqual(['2026-01-01', '2026-03-01']);
    expect(found.points[1]?.reason).toBe(reason);
  });

  it('takes a missing condition for its default', () => {
    const found = series('sixMinuteWalkDistance', [walk('2026-01-01', 300, { courseM: 30 }), walk('2026-03-01', 340)]);
    expect(pair(found)).toEqual(['2026-01-01', '2026-03-01']);
  });

  it.each([
    ['A', false, true],
    ['C', false, true],
    [null, false, true],
    ['D', false, false],
    ['E', false, false],
    ['D', true, true],
    ['U', true, false],
  ])('quality %s with low quality asked for %s: compared %s', (quality, includeLowQuality, expected) => {
    const found = series(
      'fev1',
      [...spirometry('2026-01-01', 1.3, 2.8), ...spirometry('2026-03-01', 1.4, 2.8, { quality })],
      { includeLowQuality },
    );
    expect(found.points[1]?.compared).toBe(expected);
    if (!expected) expect(found.points[1]?.reason).toBe(`quality ${quality}`);
  });

  it('has no point of quality F, and says when quality was not graded', () => {
    const found = series('fev1', [
      ...spirometry('2026-01-01', 1.3, 2.8),
      ...spirometry('2026-02-01', 1.3, 2.8, { quality: 'F' }),
      ...spirometry('2026-03-01', 1.4, 2.8, { quality: 'A' }),
    ]);
    expect(found.points).toHaveLength(2);
    expect(found.notes).toContain('Quality not graded.');
  });

  it.each([
    [{ oxygenLpm: 2 }, 'Oxygen during the test: 0 L/min at baseline, 2 L/min at the latest test.'],
    [{ aid: 'rollator' }, 'Walking aid: none at baseline, rollator at the latest test.'],
    [{ walks: 2 }, 'Number of walks: 1 at baseline, 2 at the latest test.'],
  ])('is not blocked by %j, which is noted', (conditions, note) => {
    const found = series('sixMinuteWalkDistance', [walk('2026-01-01', 300), walk('2026-03-01', 340, conditions)]);
    expect(found.change?.absolute).toBe(40);
    expect(found.notes).toContain(note);
  });

  it.each([
    [{ heightCm: 172 }, 'Height changed from 174.5 to 172.0 cm; percent predicted moves with it.'],
    [{ heightCm: 173 }, null],
    [
      { heightMethod: 'stated' },
      'Height was measured at baseline and stated at the latest test; percent predicted and z are shown and not compared.',
    ],
  ])('is not blocked by a height of %j', (height, note) => {
    const found = series('fev1', [
      ...spirometry('2026-01-01', 1.3, 2.8),
      ...spirometry('2026-03-01', 1.4, 2.8, height),
    ]);
    expect(found.change).not.toBeNull();
    if (note) expect(found.notes).toContain(note);
    else expect(found.notes.filter((text) => text.startsWith('Height'))).toEqual([]);
  });

  it('is not blocked by an exacerbation within 4 weeks, which is noted', () => {
    const results = [result('cat', '2026-01-01', 24), result('cat', '2026-03-01', 20)];
    const near = series('cat', results, {}, { exacerbationOnsets: ['2026-02-01'] });
    expect(near.notes).toContain('Exacerbation of Feb 1, 2026 within 4 weeks of the latest test.');
    const far = series('cat', results, {}, { exacerbationOnsets: ['2026-01-31'] });
    expect(far.notes.join(' ')).not.toContain('Exacerbation');
  });
});

describe('TR-1 (c) one a day', () => {
  it('takes the last of a day', () => {
    const found = series('cat', [
      result('cat', '2026-01-01T09:00', 24),
      result('cat', '2026-01-01T15:00', 22),
      result('cat', '2026-03-01', 20),
    ]);
    expect(found.points).toHaveLength(3);
    expect(found.baseline?.value).toBe(22);
    expect(found.points[0]).toMatchObject({ compared: false, reason: 'the last of the day counts' });
  });

  it('takes the best of repeated walks', () => {
    const found = series('sixMinuteWalkDistance', [
      walk('2026-01-01T09:00', 320),
      walk('2026-01-01T10:00', 310),
      walk('2026-03-01', 352),
    ]);
    expect(found.baseline?.value).toBe(320);
    expect(found.points[1]?.reason).toBe('the best of the day counts');
    expect(found.change?.absolute).toBe(32);
  });
});

describe('TR-1 (d) state', () => {
  const at = (when: string, state: 'after' | 'before' | 'none' | 'unknown') => spirometry(when, 1.4, 2.8, { state });

  it('is the first of after, before, none, unknown with a baseline and a later day', () => {
    const both = [
      ...at('2026-01-01', 'before'),
      ...at('2026-01-02', 'after'),
      ...at('2026-02-01', 'before'),
      ...at('2026-02-02', 'after'),
    ];
    expect(series('fev1', both).state).toBe('after');
    const single = [...at('2026-01-02', 'after'), ...at('2026-01-01', 'before'), ...at('2026-02-01', 'before')];
    expect(series('fev1', single).state).toBe('before');
    const none = [...at('2026-01-01', 'none'), ...at('2026-02-01', 'none'), ...at('2026-03-01', 'unknown')];
    expect(series('fev1', none).state).toBe('none');
  });

  it('is that of the newest point when no state has a later day, without latest and change', () => {
    const found = series('fev1', [...at('2026-01-01', 'after'), ...at('2026-02-01', 'before')]);
    expect(found).toMatchObject({ state: 'before', latest: null, change: null });
    expect(found.baseline?.takenOn).toBe('2026-02-01');
    expect(found.notes).toContain('One test so far, nothing to compare yet.');
  });

  it('is overridden by the one asked for', () => {
    const results = [
      ...at('2026-01-01', 'before'),
      ...at('2026-01-02', 'after'),
      ...at('2026-02-01', 'before'),
      ...at('2026-02-02', 'after'),
    ];
    expect(pair(series('fev1', results, { state: 'before' }))).toEqual(['2026-01-01', '2026-02-01']);
    expect(series('fev1', results, { state: 'none' })).toMatchObject({ state: 'none', baseline: null, latest: null });
    expect(series('cat', [result('cat', '2026-01-01', 20)], { state: 'after' }).state).toBeNull();
  });

  it('says first when the newest test of all is left out', () => {
    const found = series('fev1', [
      ...at('2026-01-01', 'after'),
      ...at('2026-02-01', 'after'),
      ...at('2026-03-01', 'before'),
    ]);
    expect(found.notes[0]).toBe('The newest test, of Mar 1, 2026, is not compared: taken before bronchodilator.');
  });
});

describe('TR-1 (e) anchor', () => {
  const results = ['2025-06-01', '2025-12-01', '2026-01-05', '2026-01-15', '2026-03-01'].map((on, index) =>
    result('cat', on, 25 - index),
  );
  const baseline = (enrollments: TrendInput['enrollments'], askedFor?: string) =>
    series('cat', results, askedFor ? { enrollment: askedFor } : {}, { enrollments }).baseline?.takenOn;

  it('is the first attended exercise session, before that the start date', () => {
    expect(baseline([enrollment({ startOn: '2026-01-10' })])).toBe('2026-01-05');
    expect(baseline([enrollment({ startOn: '2026-01-10', firstExerciseOn: '2026-01-15' })])).toBe('2026-01-15');
  });

  it('follows the asked, else the active, else the most recent enrollment, else none', () => {
    const old = enrollment({ id: 'old', status: 'completed', startOn: '2025-06-10' });
    const active = enrollment({ id: 'active', status: 'active', startOn: '2026-01-10' });
    const planned = enrollment({ id: 'planned', status: 'planned', startOn: '2026-03-01' });
    expect(baseline([old, active, planned])).toBe('2026-01-05');
    expect(baseline([old, planned])).toBe('2026-03-01');
    expect(baseline([old, active], 'old')).toBe('2025-06-01');
    expect(baseline([])).toBe('2025-06-01');
    expect(baseline([active], 'other')).toBe('2025-06-01');
  });
});

describe('TR-1 (f) baseline', () => {
  const start = { enrollments: [enrollment({ startOn: '2026-01-10' })] };
  const on = (...days: string[]) => days.map((day) => result('cat', day, 20));

  it.each([
    [['2025-10-12', '2025-12-01', '2026-02-01'], '2025-12-01', null],
    [['2025-10-12', '2026-02-01'], '2025-10-12', null],
    [['2026-01-10', '2026-02-01'], '2026-01-10', null],
    [['2025-10-11', '2026-02-01', '2026-03-01'], '2026-02-01', 'Baseline is the first test after the start.'],
    [['2025-01-01', '2025-10-11'], '2025-10-11', 'Baseline is 91 days before the start.'],
  ])('of %j is %s', (days, expected, note) => {
    const found = series('cat', on(...days), {}, start);
    expect(found.baseline?.takenOn).toBe(expected);
    if (note) expect(found.notes).toContain(note);
    else expect(found.notes.filter((text) => text.startsWith('Baseline'))).toEqual([]);
  });

  it('is the first comparable day without an enrollment', () => {
    expect(pair(series('cat', on('2020-01-01', '2026-01-01', '2026-02-01')))).toEqual(['2020-01-01', '2026-02-01']);
  });
});

describe('TR-1 (g) latest', () => {
  const results = ['2026-01-05', '2026-03-20', '2026-04-28', '2026-04-29', '2026-08-01'].map((on) =>
    result('cat', on, 20),
  );
  const latest = (more: Parameters<typeof enrollment>[0]) =>
    series('cat', results, {}, { enrollments: [enrollment(more)] }).latest?.takenOn ?? null;

  it('is the last comparable day after the baseline', () => {
    expect(latest({ status: 'active' })).toBe('2026-08-01');
  });

  it.each(['completed', 'partly-completed', 'withdrawn'])(
    'of a %s enrollment is at most 28 days after the last session',
    (status) => {
      expect(latest({ status, lastSessionOn: '2026-04-01' })).toBe('2026-04-29');
      expect(latest({ status, lastSessionOn: '2026-03-31' })).toBe('2026-04-28');
      expect(latest({ status, lastSessionOn: '2026-01-15' })).toBeNull();
    },
  );

  it('says that no test came in time', () => {
    const enrollments = [enrollment({ status: 'completed', lastSessionOn: '2026-01-15' })];
    expect(series('cat', results, {}, { enrollments }).notes).toContain(
      'No comparable test up to 28 days after the last session.',
    );
  });
});
