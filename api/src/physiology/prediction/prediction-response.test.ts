import { predictionResponse as contract } from '@slighthill/shared/contracts/prediction';
import { describe, expect, it } from 'vitest';
import { getReferenceSet } from '../reference-sets/index';
import { predictionResponse } from './prediction-response';
import type { PredictionRequest, PredictionResponse } from './types';

const clinic = { ratioRule: 'fixed-ratio', fev1SeverityRule: 'ats-ers-2005', tlcSeverityRule: 'tlc-percent' } as const;
const man: PredictionRequest = {
  referenceSet: 'gli-global-2022',
  sex: 'male',
  ageYears: 67.5,
  heightCm: 174.5,
  values: {},
};

function respond(change: Partial<PredictionRequest>): PredictionResponse {
  const outcome = predictionResponse({ ...man, ...change }, clinic);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.errors));
  expect(() => contract.parse(outcome.response)).not.toThrow();
  return outcome.response;
}

const errorsOf = (change: Partial<PredictionRequest>) => {
  const outcome = predictionResponse({ ...man, ...change }, clinic);
  return outcome.ok ? [] : outcome.errors.map((error) => error.path);
};

describe('predictions', () => {
  it('give every measure of the named set when no value is given', () => {
    const { measures, pattern, grades } = respond({});
    expect(Object.keys(measures)).toEqual(['fev1', 'fvc', 'fev1fvc']);
    expect(measures.fev1).toMatchObject({ value: null, percentPredicted: null, z: null });
    expect(measures.fev1?.predicted).toBeGreaterThan(measures.fev1?.lln ?? Infinity);
    expect(pattern).toBeNull();
    expect(grades).toEqual([]);
  });

  it('derive the ratio, name the pattern and grade it', () => {
    const { measures, pattern, grades, notes } = respond({
      values: { fev1: 1.32, fvc: 2.78 },
      bronchodilator: 'after',
    });
    expect(measures.fev1fvc?.value).toBeCloseTo(0.47482, 6);
    expect(measures.fev1?.percentPredicted).toBeCloseTo(44, 0);
    // This FVC is below its LLN, so without a TLC restriction is not excluded.
    expect(pattern).toMatchObject({ id: 'obstruction-possible-mixed', provisional: false });
    expect(pattern).toMatchObject({ lowByFixedRatio: true, lowByLln: true });
    expect(respond({ values: { fev1: 1.32, fvc: 2.78, tlc: 7.5 } }).pattern?.id).toBe('obstruction');
    expect(grades).toEqual([{ rule: 'ats-ers-2005', measure: 'fev1', bandId: 'severe', label: 'severe' }]);
    expect(notes).toContain('FEV1/FVC was worked out from FEV1 and FVC.');
  });

  it('are provisional when no state is given', () => {
    expect(respond({ values: { fev1: 1.32, fvc: 2.78 } }).pattern?.provisional).toBe(true);
  });

  it('use the default set of another kind, each naming its own', () => {
    const { measures } = respond({ values: { tlc: 5.1, dlco: 14, pef: 5, sixMinuteWalkDistance: 410 }, weightKg: 78 });
    expect(measures.tlc?.referenceSet).toBe('gli-2021-lung-volumes');
    expect(measures.dlco?.referenceSet).toBe('gli-2017-transfer-factor');
    expect(measures.sixMinuteWalkDistance?.referenceSet).toBe('enright-sherrill-1998');
    expect(measures.pef).toMatchObject({ referenceSet: null, predicted: null, reason: 'no-equation', value: 5 });
  });

  it('judge the ratio on milliliters (rule 0.3)', () => {
    expect(respond({ values: { fev1: 2.905, fvc: 4.15 } }).pattern?.lowByFixedRatio).toBe(false);
    expect(respond({ values: { fev1: 2.905, fvc: 4.15, fev1fvc: 2.905 / 4.15 } }).pattern?.lowByFixedRatio).toBe(false);
    expect(respond({ values: { fev1: 2.904, fvc: 4.15 } }).pattern?.lowByFixedRatio).toBe(true);
  });

  it('say of a TLC without a prediction that it was not left out', () => {
    // GLI 2021 lung volumes end at 80 years (Hall 2021, ERJ 57:2000289).
    const values = { fev1: 1.32, fvc: 2.1, tlc: 7.4 };
    const { pattern } = respond({ ageYears: 85, values, bronchodilator: 'after' });
    expect(pattern?.notes).toContain('TLC has no predicted value, so restriction cannot be judged.');
    const without = respond({ ageYears: 85, values: { fev1: 1.32, fvc: 2.1 }, bronchodilator: 'after' }).pattern;
    expect(without?.notes).toContain('No TLC, so restriction cannot be judged.');
  });

  it('say why there is no prediction', () => {
    const old = respond({ ageYears: 96, values: { fev1: 1, fvc: 2 } });
    expect(old.measures.fev1).toMatchObject({ predicted: null, lln: null, reason: 'age-outside-set', value: 1 });
    expect(old.pattern).toBeNull();
    expect(old.notes.join(' ')).toContain('age is outside GLI Global 2022');
    expect(respond({ values: { sixMinuteWalkDistance: 400 } }).measures.sixMinuteWalkDistance?.reason).toBe(
      'no-weight',
    );
  });

  it('give NHANES III an approximate z and compare with its LLN', () => {
    const set = { referenceSet: 'nhanes-iii-1999', group: 'caucasian', ageYears: 65, heightCm: 172 } as const;
    const { measures, pattern } = respond({ ...set, values: { fev1: 1.8, fvc: 3.4 }, bronchodilator: 'after' });
    expect(measures.fev1).toMatchObject({ z: null, uln: null });
    expect(measures.fev1?.zApproximate).toBeCloseTo(-3.015, 3);
    expect(pattern).toMatchObject({ id: 'obstruction', lowByLln: true });
  });

  it('grade scores and the transfer factor', () => {
    const { grades } = respond({ values: { cat: 22, dlco: 9 } });
    expect(grades).toContainEqual({ rule: 'default', measure: 'cat', bandId: 'high', label: 'high impact' });
    expect(grades.find((grade) => grade.measure === 'dlco')?.bandId).toBe('severe');
    expect(respond({ values: { dlco: 26 } }).grades).toEqual([]);
  });

  // Rule GR-14: 60.1 percent with the LLN above it is mild, at or above the LLN it is none.
  it('grade a DLCO just over 60 percent only below its LLN', () => {
    const person = { ...man, sex: 'female' as const };
    const predicted =
      respond(person).referenceSet && respond({ ...person, values: { dlco: 1 } }).measures.dlco?.predicted;
    const grade = respond({ ...person, values: { dlco: (predicted ?? 0) * 0.601 } }).grades;
    expect(grade).toEqual([{ rule: 'dlco-2005', measure: 'dlco', bandId: 'mild', label: 'mild' }]);
    expect(respond({ ...person, values: { dlco: (predicted ?? 0) * 0.9 } }).grades).toEqual([]);
  });

  // Common practice, from the GLI 2021 tables (rule GR-8).
  it('follow the LLN for restriction: a woman of 40 with 81 percent, a man of 80 with 78 percent', () => {
    const volumes = getReferenceSet('gli-2021-lung-volumes');
    const woman = { sex: 'female', ageYears: 40, heightCm: 163 } as const;
    const tlcOf = (person: typeof woman | { sex: 'male'; ageYears: number; heightCm: number }, part: number) =>
      volumes.evaluate('tlc', person).predicted * part;
    const low = respond({ ...woman, values: { fev1: 2, fvc: 2.4, tlc: tlcOf(woman, 0.81) } });
    expect(low.pattern?.id).toBe('restriction');
    expect(low.grades).toEqual([{ rule: 'tlc-percent', measure: 'tlc', bandId: 'mild', label: 'mild (LLN)' }]);
    const old = { sex: 'male', ageYears: 80, heightCm: 172 } as const;
    const normal = respond({ ...old, values: { fev1: 2.4, fvc: 3.2, tlc: tlcOf(old, 0.78) } });
    expect(normal.pattern?.id).not.toBe('restriction');
    expect(normal.grades.filter((grade) => grade.measure === 'tlc')).toEqual([]);
  });

  it('flag hyperinflation and gas trapping above the ULN', () => {
    const { notes } = respond({ referenceSet: 'gli-2021-lung-volumes', values: { frc: 6.5, rv: 5.5 } });
    expect(notes.join(' ')).toContain('Hyperinflation');
    expect(notes.join(' ')).toContain('Gas trapping');
  });
});

describe('input that is not enough comes back as errors', () => {
  it.each([
    [{ referenceSet: 'gli-2012' }, ['group']],
    [{ referenceSet: 'nhanes-iii-1999' }, ['group']],
    [{ referenceSet: 'nhanes-iii-1999', group: 'north-east-asian' }, ['group']],
    [{ referenceSet: 'gli-2012', group: 'other' }, []],
    [{ values: { fev1: 3, fvc: 2 } }, ['values.fev1']],
    [{ values: { fev1: -1 } }, ['values.fev1']],
    [{ values: { fev1fvc: 47 } }, ['values.fev1fvc']],
  ] as const)('%j', (change, paths) => {
    expect(errorsOf(change)).toEqual(paths);
  });

  it.each([{ ageYears: 17 }, { ageYears: 101 }, { heightCm: 65 }])('throws for %j', (change) => {
    expect(() => predictionResponse({ ...man, ...change }, clinic)).toThrow(RangeError);
  });
});
