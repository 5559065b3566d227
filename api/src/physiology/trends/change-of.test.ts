import { getMeasure, type MeasureId } from '@slighthill/shared/measures';
import { describe, expect, it } from 'vitest';
import { changeOf } from './change-of';

const at = (takenOn: string, value: number) => ({ takenAt: `${takenOn}T12:00:00.000Z`, value });
const change = (measure: MeasureId, from: number, to: number, laterOn = '2026-04-01', group = 'copd') =>
  changeOf(getMeasure(measure), at('2026-01-01', from), at(laterOn, to), group);

describe('verdicts (rule TR-8)', () => {
  // The rule's own example.
  it('COPD, FEV1 1.52 to 1.62 L over nine months is within variation', () => {
    const { change: found, notes } = change('fev1', 1.52, 1.62, '2026-10-01');
    expect(found).toMatchObject({ absolute: 0.1, verdict: 'within-variation' });
    expect(found.relativePercent).toBeCloseTo(6.6, 1);
    expect(found.yardsticks.map(({ id, reached }) => [id, reached])).toEqual([
      ['important-difference', true],
      ['test-variability', false],
      ['copd-between-sessions', false],
    ]);
    expect(notes).toEqual(['The change does not exceed 225 mL, what COPD varies by between sessions.']);
  });

  // Rule OM-0: examples of responders.
  it.each([
    ['cat', 22, 20, 'better'],
    ['cat', 22, 21, 'within-variation'],
    ['cat', 20, 22, 'worse'],
    ['sixMinuteWalkDistance', 310, 339, 'within-variation'],
    ['sixMinuteWalkDistance', 310, 340, 'better'],
    ['sixMinuteWalkDistance', 340, 310, 'worse'],
    ['shuttleWalkDistance', 180, 210, 'within-variation'],
    ['shuttleWalkDistance', 180, 220, 'better'],
    ['sgrq', 55.3, 51.3, 'better'],
    ['sgrq', 55.3, 51.4, 'within-variation'],
    ['crqDyspnea', 3.2, 3.7, 'better'],
    ['hadsAnxiety', 11, 10, 'within-variation'],
    ['mmrc', 3, 2, 'better'],
    ['sitToStandOneMinute', 17, 20, 'better'],
    ['fev1fvc', 0.47, 0.6, 'not-judged'],
    ['tlc', 5, 6, 'not-judged'],
    ['weight', 80, 60, 'not-judged'],
    ['cat', 20, 20, 'within-variation'],
  ] as const)('%s %d to %d is %s', (measure, from, to, verdict) => {
    expect(change(measure, from, to).change.verdict).toBe(verdict);
  });

  // Rule GR-11, example table (Pellegrino 2005, table 12): interval, population, exceeds variability, 100 mL reached.
  it.each([
    [1.32, 1.45, '2026-02-01', 'copd', 20, false, true],
    [1.32, 1.6, '2026-02-01', 'copd', 20, true, true],
    [2.8, 2.45, '2026-02-01', 'asthma', 12, true, true],
    [1.5, 1.27, '2027-02-01', 'copd', 15, true, true],
    [1.5, 1.28, '2027-02-01', 'copd', 15, false, true],
    [1.32, 1.15, '2026-01-01', 'copd', 13, false, true],
  ] as const)('FEV1 %d to %d L by %s, %s', (from, to, on, group, threshold, exceeds, reaches) => {
    const { change: found } = change('fev1', from, to, on, group);
    const by = (id: string) => found.yardsticks.find((yardstick) => yardstick.id === id);
    expect(by('test-variability')).toMatchObject({ threshold, unit: '%', reached: exceeds });
    expect(by('important-difference')?.reached).toBe(reaches);
    const both = exceeds && reaches;
    expect(found.verdict).toBe(both ? (to > from ? 'better' : 'worse') : 'within-variation');
  });

  it('changes row at 52 weeks', () => {
    expect(change('fev1', 1, 1.1, '2026-12-30').change.yardsticks[1]?.threshold).toBe(20);
    expect(change('fev1', 1, 1.1, '2026-12-31').change.yardsticks[1]?.threshold).toBe(15);
  });

  it('snaps the difference (rule 0.2)', () => {
    // 1.1 - 1.0 is 0.10000000000000009 and 0.4 - 0.3 is 0.10000000000000003 in doubles; 0.3 - 0.2 falls short.
    expect(0.3 - 0.2).toBeLessThan(0.1);
    expect(change('fev1', 0.2, 0.3).change).toMatchObject({ absolute: 0.1, verdict: 'better' });
  });

  it('asks for more than the row where the source prints more than (DLCO)', () => {
    expect(change('dlco', 20, 16).change.verdict).toBe('within-variation');
    expect(change('dlco', 20, 15.9).change.verdict).toBe('worse');
    expect(change('dlco', 20, 14, '2026-04-01', 'ild').change.verdict).toBe('within-variation');
    expect(change('dlco', 20, 18, '2027-02-01', 'ild').change.verdict).toBe('within-variation');
    expect(change('dlco', 20, 17.9, '2027-02-01', 'ild').change.verdict).toBe('worse');
  });

  it('does not judge where no threshold is published for the interval', () => {
    const { change: found, notes, zone } = change('fef2575', 1, 0.5, '2027-02-01');
    expect(found).toMatchObject({ verdict: 'not-judged', yardsticks: [] });
    expect(zone).toBeNull();
    expect(notes).toEqual(['No published variability for this interval.']);
  });

  it('draws the largest threshold that applies as too small to count, in the raw unit', () => {
    expect(change('fev1', 1.32, 1.4).zone).toBeCloseTo(0.264, 9);
    expect(change('fev1', 0.4, 0.45).zone).toBe(0.1);
    expect(change('cat', 22, 20).zone).toBe(2);
    expect(change('dlco', 20, 18).zone).toBe(4);
    expect(change('tlc', 5, 6).zone).toBeNull();
  });

  it('has no relative change from 0', () => {
    expect(change('mmrc', 0, 1).change).toMatchObject({ relativePercent: null, verdict: 'worse' });
  });
});
