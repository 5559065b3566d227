import { describe, expect, it } from 'vitest';
import { bestPreview, rowRatio } from './best-preview';
import { emptyRow, emptySet, emptySpirometryForm, type BlowRow, type SpirometryForm } from './spirometry-form';
import { spirometryQuestions, type SpirometryEarlier } from './spirometry-questions';
import { checkSpirometry } from './spirometry-request';
import { setsOf, withState } from './test-sets';

const zone = 'America/Denver';
const ids = [
  '11111111-1111-4111-8111-111111111111',
  '22222222-2222-4222-8222-222222222222',
  '33333333-3333-4333-8333-333333333333',
];

const blow = (fev1: string, fvc: string, more: Partial<BlowRow> = {}): BlowRow => ({
  ...emptyRow(),
  fev1,
  fvc,
  ...more,
});

const setOf = (...rows: BlowRow[]) => {
  const set = emptySet();
  rows.forEach((row, index) => (set.rows[index] = row));
  return set;
};

const form = (more: Partial<SpirometryForm> = {}): SpirometryForm => {
  let next = 0;
  return {
    ...emptySpirometryForm('2026-10-14T10:26', () => ids[next++]!),
    heightCm: '165',
    ...more,
  };
};

const nothingEarlier: SpirometryEarlier = {
  heightCm: null,
  weightKg: null,
  fev1: null,
  fvc: null,
};

describe('bestPreview', () => {
  // Rule SP-2, cases 1, 2 and 4 (Graham 2019), in liters; "usable" and "neither" are both "not used" here.
  it.each([
    ['case 1', setOf(blow('1.210', '2.560'), blow('1.260', '2.490'), blow('1.190', '2.610')), 1.26, 2.61, 1, 2],
    [
      'case 2',
      setOf(
        blow('0.900', '1.800'),
        blow('0.960', '1.740', { fvcUsed: false }),
        blow('0.870', '1.900', { fev1Used: false, fvcUsed: false }),
      ),
      0.96,
      1.8,
      1,
      0,
    ],
    ['case 4', setOf(blow('1.800', '2.400'), blow('1.800', '2.380'), blow('1.740', '2.400')), 1.8, 2.4, 0, 0],
  ])('takes the largest used FEV1 and FVC, each for itself: %s', (_name, set, fev1, fvc, fev1Row, fvcRow) => {
    expect(bestPreview(set)).toMatchObject({
      fev1,
      fvc,
      fev1Row,
      fvcRow,
      fev1fvc: fev1 / fvc,
    });
  });

  it('leaves out a blow whose FEV1 is above its FVC', () => {
    expect(bestPreview(setOf(blow('3.0', '2.0'), blow('1.4', '2.4')))).toMatchObject({ fev1: 1.4, fvc: 2.4 });
  });

  it('says nothing of an empty set', () => {
    expect(bestPreview(emptySet())).toMatchObject({
      fev1: null,
      fvc: null,
      fev1fvc: null,
    });
  });

  it('reads a comma as a decimal sign', () => {
    expect(rowRatio('1,44', '2,40')).toBeCloseTo(0.6, 9);
    expect(rowRatio('2.5', '2.4')).toBeNull();
  });
});

describe('checkSpirometry', () => {
  it('makes a pair of one visit when both sets are filled', () => {
    const { issues, tests } = checkSpirometry(
      form({
        drug: 'Albuterol',
        doseMcg: '400',
        minutesSinceDose: '15',
        before: setOf(blow('1.38', '2.36')),
        after: setOf(blow('1.46', '2.47')),
      }),
      zone,
    );
    expect(issues).toEqual([]);
    expect(tests.map(({ body }) => [body.id, body.visitId, body.bronchodilator, body.drug])).toEqual([
      [ids[1], ids[0], 'before', null],
      [ids[2], ids[0], 'after', 'Albuterol'],
    ]);
  });

  it('puts the test before the dose earlier by the minutes waited; after keeps the time entered', () => {
    const pair = {
      before: setOf(blow('1.38', '2.36')),
      after: setOf(blow('1.46', '2.47')),
    };
    const times = (more: Partial<SpirometryForm>) =>
      checkSpirometry(form({ ...pair, ...more }), zone).tests.map(({ body }) => body.performedAt);
    expect(times({ minutesSinceDose: '15' })).toEqual(['2026-10-14T16:11:00.000Z', '2026-10-14T10:26:00-06:00']);
    expect(times({ minutesSinceDose: '' })).toEqual(['2026-10-14T16:25:00.000Z', '2026-10-14T10:26:00-06:00']);
    expect(times({ minutesSinceDose: '0' })[0]).toBe('2026-10-14T16:25:00.000Z');
  });

  it('waits in real minutes where clocks go back', () => {
    const { tests } = checkSpirometry(
      form({
        performedAt: '2026-11-01T02:05',
        minutesSinceDose: '15',
        before: setOf(blow('1.38', '2.36')),
        after: setOf(blow('1.46', '2.47')),
      }),
      zone,
    );
    expect(tests.map(({ body }) => body.performedAt)).toEqual([
      '2026-11-01T08:50:00.000Z',
      '2026-11-01T02:05:00-07:00',
    ]);
  });

  it('moves no time of a test that stands alone', () => {
    const { tests } = checkSpirometry(form({ minutesSinceDose: '15', before: setOf(blow('1.38', '2.36')) }), zone);
    expect(tests[0]?.body.performedAt).toBe('2026-10-14T10:26:00-06:00');
  });

  it('makes one test without a visit when one set is filled', () => {
    const { tests } = checkSpirometry(form({ state: 'none', before: setOf(blow('1.38', '2.36')) }), zone);
    expect(tests).toHaveLength(1);
    expect(tests[0]?.body).toMatchObject({
      bronchodilator: 'none',
      id: ids[1],
    });
    expect(tests[0]?.body.visitId).toBeUndefined();
  });

  it('refuses an FEV1 above its FVC in words, at the row it was typed in', () => {
    const { issues } = checkSpirometry(
      form({
        before: setOf(blow('1.4', '2.4'), emptyRow(), blow('3.24', '3.10')),
      }),
      zone,
    );
    expect(issues).toEqual([
      {
        path: 'before.rows.2.fev1',
        message: 'FEV1 cannot be more than FVC (3.10 L)',
      },
    ]);
  });

  it('asks for what is missing by its name', () => {
    const { issues } = checkSpirometry(form({ heightCm: '', before: setOf(blow('1.4', '')) }), zone);
    expect(issues).toEqual([
      { path: 'heightCm', message: 'Enter the height' },
      { path: 'before.rows.0.fvc', message: 'Enter FVC' },
    ]);
  });

  it('says that text is no number', () => {
    const { issues } = checkSpirometry(form({ after: setOf(blow('1.4x', '2.4')) }), zone);
    expect(issues).toEqual([{ path: 'after.rows.0.fev1', message: 'FEV1 must be a number' }]);
  });

  it('sends no numbers of a set that the state hides, and says so', () => {
    const { issues, tests } = checkSpirometry(form({ state: 'none', after: setOf(blow('1.4', '2.4')) }), zone);
    expect(tests).toEqual([]);
    expect(issues[0]?.path).toBe('state');
  });

  it('wants at least one maneuver', () => {
    expect(checkSpirometry(form(), zone).issues).toEqual([
      { path: 'before.rows.0.fev1', message: 'Enter at least one maneuver' },
    ]);
  });
});

describe('spirometryQuestions', () => {
  const texts = (more: Partial<SpirometryForm>, earlier: Partial<SpirometryEarlier> = {}) =>
    spirometryQuestions(form(more), { ...nothingEarlier, ...earlier });

  it('asks whether 65 cm was inches and offers the answer', () => {
    const [question] = texts({ heightCm: '65' });
    expect(question).toMatchObject({
      field: 'heightCm',
      text: '65 cm. Did you mean 65 inches (165.1 cm)?',
      fix: { label: 'Yes, 165.1 cm', value: '165.1' },
      mayStand: false,
    });
  });

  it('asks about equal FEV1 and FVC', () => {
    expect(texts({ state: 'none', before: setOf(blow('2.40', '2.4')) }).map((question) => question.text)).toEqual([
      'Maneuver 1: FEV1 equals FVC (2.40 L). Is that right?',
    ]);
  });

  it('asks above a change of 30 percent from the last, not at it', () => {
    const earlier = { fev1: { value: 2, on: '2026-08-24' } };
    expect(texts({ before: setOf(blow('1.40', '3.0')) }, earlier)).toEqual([]);
    const [question] = texts({ before: setOf(blow('1.39', '3.0')) }, earlier);
    expect(question?.text).toContain('below the last, 2.00 L on Aug 24');
    expect(question?.field).toBe('before.rows.0.fev1');
  });

  it('asks about a height that moved by more than 1.5 cm and a weight by more than a tenth', () => {
    const earlier = {
      heightCm: { value: 165, on: '2026-08-24' },
      weightKg: { value: 60, on: '2026-08-24' },
    };
    expect(texts({ heightCm: '166.5', weightKg: '66' }, earlier)).toEqual([]);
    expect(texts({ heightCm: '166.6', weightKg: '66.1' }, earlier).map((question) => question.field)).toEqual([
      'heightCm',
      'weightKg',
    ]);
  });

  it('asks about a value outside the usual range (rule 0.7)', () => {
    expect(texts({ after: setOf(blow('0.25', '1.5')) }).map((question) => question.field)).toEqual([
      'after.rows.0.fev1',
    ]);
  });
});

describe('withState', () => {
  it('moves the numbers of one test when its state is corrected', () => {
    const amended = withState(form({ state: 'before', before: setOf(blow('1.4', '2.4')) }), 'after');
    expect(setsOf(amended.state)).toEqual(['after']);
    expect(amended.after.rows[0]?.fev1).toBe('1.4');
    expect(amended.before.rows[0]?.fev1).toBe('');
  });
});
