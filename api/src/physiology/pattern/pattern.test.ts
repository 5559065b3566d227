import { describe, expect, it } from 'vitest';
import { judgePattern, type Judged, type PatternRules, type PatternTest } from './judge-pattern';
import { patternIds, patternOf } from './pattern-of';
import { isPrism } from './prism';

const low = (z: number) => z < -1.645;
const unknown = null;

// Rule GR-5, example table (ERS/ATS 2021).
it.each([
  [-3.1, -0.9, -3.4, unknown, 'obstruction'],
  [-2.2, -2.4, -3.0, unknown, 'obstruction-possible-mixed'],
  [-2.2, -2.4, -3.0, -1.2, 'obstruction'],
  [-2.2, -2.4, -3.0, -2.1, 'mixed'],
  [0.3, -2.6, -2.3, unknown, 'possible-restriction'],
  [0.3, -2.6, -2.3, -2.9, 'restriction'],
  [0.3, -2.0, -1.9, -0.8, 'non-specific'],
  [-1.645, -1.645, -1.645, -1.645, 'normal'],
  [-1.9, 0.8, -0.7, unknown, 'obstruction-fev1-normal'],
  [0.1, -1.2, -1.8, unknown, 'fev1-low-only'],
] as const)('z of ratio %d, FVC %d, FEV1 %d, TLC %s is %s', (ratio, fvc, fev1, tlc, id) => {
  const inputs = { ratioLow: low(ratio), fvcLow: low(fvc), fev1Low: low(fev1), tlcLow: tlc === null ? null : low(tlc) };
  expect(patternOf(inputs)).toBe(id);
});

it('never names restriction or mixed without a TLC, and reaches every pattern (rule GR-5)', () => {
  const reached = new Set<string>();
  for (const ratioLow of [true, false])
    for (const fvcLow of [true, false])
      for (const fev1Low of [true, false])
        for (const tlcLow of [true, false, null]) {
          const id = patternOf({ ratioLow, fvcLow, fev1Low, tlcLow });
          reached.add(id);
          if (tlcLow === null) expect(['restriction', 'mixed']).not.toContain(id);
        }
  expect([...reached].sort()).toEqual([...patternIds].sort());
});

// Rule GR-6 (GOLD).
it.each([
  [false, 71, true],
  [false, 79.99, true],
  [false, 80, false],
  [true, 60, false],
  [false, null, false],
])('PRISm with low ratio %s and %s percent: %s', (ratioLow, fev1PercentPredicted, expected) => {
  expect(isPrism({ ratioLow, fev1PercentPredicted })).toBe(expected);
});

const judged = (percentPredicted: number, z: number): Judged => ({
  value: 1,
  percentPredicted,
  z,
  belowLln: z < -1.645,
});

const obstructive: PatternTest = {
  ratioLowByFixed: true,
  ratioLowByLln: true,
  fev1: judged(46, -3.1),
  fvc: judged(85, -1),
  tlc: judged(112, 0.9),
  state: 'after',
};

const rules: PatternRules = {
  ratioRule: 'fixed-ratio',
  fev1Rule: 'ats-ers-2005',
  tlcRule: 'tlc-percent',
  copdConfirmed: false,
};

describe('pattern, severity and heading (rule GR-0)', () => {
  it('grades obstruction by FEV1', () => {
    const pattern = judgePattern(obstructive, rules);
    expect(pattern).toMatchObject({
      id: 'obstruction',
      label: 'Obstructive',
      heading: 'Obstructive pattern, severe',
      provisional: false,
      severity: { rule: 'ats-ers-2005', measure: 'fev1', bandId: 'severe' },
    });
  });

  it('says so when the two ratio rules disagree', () => {
    const fixedOnly = { ...obstructive, ratioLowByLln: false };
    expect(judgePattern(fixedOnly, rules).heading).toBe('Obstructive by fixed ratio, not by LLN');
    expect(judgePattern(fixedOnly, { ...rules, ratioRule: 'lln' })).toMatchObject({
      id: 'non-specific',
      heading: 'Non-specific by LLN, obstructive by fixed ratio',
      lowByFixedRatio: true,
      lowByLln: false,
    });
    const mixedFixedOnly = { ...fixedOnly, fvc: judged(60, -2.5), tlc: null };
    expect(judgePattern(mixedFixedOnly, rules).heading).toBe(
      'Obstructive by fixed ratio, not by LLN, restriction not excluded',
    );
  });

  it('is provisional in any state but after bronchodilator', () => {
    for (const state of ['before', 'none', 'unknown'] as const) {
      const pattern = judgePattern({ ...obstructive, state }, rules);
      expect(pattern.provisional).toBe(true);
      expect(pattern.notes.some((note) => note.startsWith('Provisional'))).toBe(true);
    }
  });

  it('gives severity to nothing but obstruction, mixed and restriction', () => {
    const ratioNormal = { ...obstructive, ratioLowByFixed: false, ratioLowByLln: false };
    expect(judgePattern(ratioNormal, rules)).toMatchObject({ id: 'non-specific', severity: null });
    expect(judgePattern({ ...ratioNormal, tlc: null }, rules)).toMatchObject({ id: 'fev1-low-only', severity: null });
    expect(judgePattern({ ...ratioNormal, tlc: judged(65, -3) }, rules).severity).toMatchObject({
      measure: 'tlc',
      bandId: 'moderate',
    });
    expect(judgePattern({ ...obstructive, tlc: judged(65, -3) }, rules)).toMatchObject({
      id: 'mixed',
      severity: { measure: 'fev1', bandId: 'severe' },
    });
  });

  // Rule GR-8, common practice: presence follows the LLN, the band the percentage.
  it('calls a TLC below the LLN at 81 percent "mild (LLN)", and one of 78 percent above it not restrictive', () => {
    const ratioNormal = { ...obstructive, ratioLowByFixed: false, ratioLowByLln: false };
    const byLln = judgePattern({ ...ratioNormal, tlc: judged(81, -1.7) }, rules);
    expect(byLln).toMatchObject({ id: 'restriction', heading: 'Restrictive pattern, mild (LLN)' });
    expect(byLln.severity).toMatchObject({ bandId: 'mild', label: 'mild (LLN)' });
    expect(judgePattern({ ...ratioNormal, tlc: judged(78, -1.6) }, rules).id).toBe('non-specific');
  });

  it('gives a GOLD grade only to confirmed COPD after bronchodilator (rule GR-7)', () => {
    const gold = { ...rules, fev1Rule: 'gold' as const };
    expect(judgePattern(obstructive, gold).severity).toBeNull();
    expect(judgePattern(obstructive, gold).notes.join(' ')).toContain('GOLD grades need COPD confirmed');
    const confirmed = { ...gold, copdConfirmed: true };
    expect(judgePattern(obstructive, confirmed).severity).toMatchObject({ bandId: 'gold-3', label: 'GOLD 3' });
    expect(judgePattern({ ...obstructive, state: 'before' }, confirmed).severity).toBeNull();
    expect(
      judgePattern({ ...obstructive, ratioLowByFixed: false }, { ...confirmed, ratioRule: 'lln' }).severity,
    ).toBeNull();
  });

  it('has no z severity in a set without z', () => {
    const noZ = { ...obstructive, fev1: { ...obstructive.fev1, z: null } };
    const pattern = judgePattern(noZ, { ...rules, fev1Rule: 'ers-ats-2021' });
    expect(pattern.severity).toBeNull();
    expect(pattern.notes).toContain('No severity: this reference set gives no z-score.');
  });
});
