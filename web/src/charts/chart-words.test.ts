import { describe, expect, it } from 'vitest';
import { describePoint } from './describe-point';
import { describeTrend, measureTitle } from './describe-trend';
import { formatAmount, formatInView } from './format-measure';
import { nearestMark, readerKey } from './reader-keys';
import { aPoint, aSeries, catSeries, fev1Series, mmrcSeries, ratioSeries, walkSeries } from './testing/trend-fixture';
import { changeWords, fromToWords, verdictWords } from './verdict-words';

const baseline = fev1Series.baseline;
if (!baseline) throw new Error('the fixture has a baseline');

describe('verdict words', () => {
  it('follow rule TR-8', () => {
    expect(verdictWords(fev1Series).words).toBe('Within expected variation');
    expect(verdictWords(walkSeries)).toMatchObject({ words: 'Better by 42 m', icon: 'rising' });
    expect(verdictWords(catSeries)).toMatchObject({ words: 'Better by 5', icon: 'rising' });
    expect(verdictWords(mmrcSeries).words).toBe('Better by 1 grade');
    expect(verdictWords(ratioSeries).words).toBe('Not judged');
    const small = {
      ...walkSeries,
      change: { absolute: 8, relativePercent: 2, verdict: 'within-variation' as const, yardsticks: [] },
    };
    expect(verdictWords(small).words).toBe('Too small to count');
    const worse = {
      ...walkSeries,
      change: { absolute: -35, relativePercent: -10, verdict: 'worse' as const, yardsticks: [] },
    };
    expect(verdictWords(worse)).toMatchObject({ words: 'Worse by 35 m', icon: 'falling' });
  });

  it('say when there is nothing to compare', () => {
    const one = aSeries('cat', [aPoint('2026-08-31', 22, { role: 'baseline' })]);
    expect(verdictWords(one).words).toBe('One test so far, nothing to compare yet');
    expect(changeWords(one)).toBeNull();
    expect(fromToWords(one)).toBeNull();
  });

  it('give direction and size of the change', () => {
    expect(changeWords(fev1Series)).toBe('0.06 L up since baseline');
    expect(changeWords(catSeries)).toBe('5 down since baseline');
    expect(fromToWords(walkSeries)).toBe('310 to 352, 30 or more counts');
    expect(fromToWords(ratioSeries)).toBe('0.47 to 0.48, no agreed difference');
    expect(formatAmount('mmrc', 2, 'grade')).toBe('2 grades');
  });
});

describe('describeTrend', () => {
  it('states baseline, latest and verdict in one sentence', () => {
    expect(describeTrend(fev1Series, 'percent-predicted')).toBe(
      'FEV1, percent predicted: baseline 44% (1.32 L) on Aug 31, 2026, latest 46% (1.38 L) on Oct 12, 2026. ' +
        'Within expected variation, 0.06 L up since baseline.',
    );
    expect(measureTitle(fev1Series, 'value')).toBe('FEV1, liters');
  });

  it('does not repeat a unit that the name already says', () => {
    expect(describeTrend(mmrcSeries, 'value')).toBe(
      'mMRC breathlessness grade: baseline 3 on Aug 31, 2026, latest 2 on Oct 12, 2026. ' +
        'Better by 1 grade, 1 grade down since baseline.',
    );
    expect(measureTitle(walkSeries, 'value')).toBe('6-minute walk distance, meters');
  });

  it('speaks of a single test and of none', () => {
    const one = aSeries('cat', [aPoint('2026-08-31', 22)]);
    expect(describeTrend(one, 'value')).toBe(
      'COPD Assessment Test: 22 on Aug 31, 2026. One test so far, nothing to compare yet.',
    );
    expect(describeTrend(aSeries('cat', []), 'value')).toBe('COPD Assessment Test: no results.');
  });
});

describe('describePoint', () => {
  it('says all there is about a point', () => {
    const described = describePoint(fev1Series, baseline);
    expect(described.figures).toEqual([
      { value: '1.32 L', label: 'FEV1' },
      { value: '44%', label: 'of 3.00 L' },
      { value: '\u22123.30', label: 'z-score' },
    ]);
    expect(described.details).toBe(
      'After bronchodilator, grade A. LLN 2.20 L. Severe, 35 to under 50. GLI Global 2022 at age 67.5, 174.5 cm.',
    );
    expect(described.spoken).toBe(
      `Aug 31, 2026, baseline. FEV1 1.32 L, 44% of 3.00 L, z-score \u22123.30. ${described.details}`,
    );
  });

  it('says why a point is left out, and what was the case during a walk', () => {
    const first = fev1Series.points[0];
    expect(first && describePoint(fev1Series, first).details).toContain('Taken before bronchodilator.');
    const walk = walkSeries.baseline;
    expect(walk && describePoint(walkSeries, walk).details).toContain('Oxygen during the test 2 L/min.');
  });

  it('never gives a ratio as percent predicted', () => {
    const ratio = aPoint('2026-08-31', 0.47, { predicted: 0.77, percentPredicted: 61, z: -3 });
    expect(describePoint(ratioSeries, ratio).figures.map((figure) => figure.label)).toEqual(['FEV1/FVC', 'z-score']);
  });
});

describe('formatInView', () => {
  it('keeps a percentage in the band it lies in (rule 0.4)', () => {
    expect(formatInView('fev1', 49.96, 'percent-predicted', 'L', fev1Series.bands)).toBe('49.96%');
    expect(formatInView('fev1', 46.2, 'percent-predicted', 'L', fev1Series.bands)).toBe('46%');
    expect(formatInView('fev1', -1.6451, 'z', 'L', [])).toBe('\u22121.6451');
  });
});

describe('reader', () => {
  it('moves by keys and stops at both ends', () => {
    expect(readerKey('ArrowRight', null, 7)).toBe(0);
    expect(readerKey('ArrowLeft', null, 7)).toBe(6);
    expect(readerKey('ArrowRight', 6, 7)).toBe(6);
    expect(readerKey('ArrowLeft', 0, 7)).toBe(0);
    expect(readerKey('End', 2, 7)).toBe(6);
    expect(readerKey('Home', 2, 7)).toBe(0);
    expect(readerKey('Escape', 2, 7)).toBeNull();
    expect(readerKey('Escape', null, 7)).toBeUndefined();
    expect(readerKey('a', 2, 7)).toBeUndefined();
    expect(readerKey('ArrowRight', null, 0)).toBeUndefined();
  });

  it('finds the mark nearest to the pointer, and the nearer of two on one date', () => {
    const marks = [
      { x: 100, y: 50 },
      { x: 100, y: 90 },
      { x: 300, y: 50 },
    ];
    expect(nearestMark(marks, { x: 110, y: 85 })).toBe(1);
    expect(nearestMark(marks, { x: 250, y: 85 })).toBe(2);
    expect(nearestMark([], { x: 0, y: 0 })).toBeNull();
  });
});
