import { ageAt } from '@slighthill/api/physiology/age-at';
import { defaultReferenceSet } from '@slighthill/api/physiology/reference-sets/index';
import { predict } from '@slighthill/api/physiology/reference-sets/predict';
import type { MeasureId, ReferenceKind } from '@slighthill/shared/measures';
import type { DemoPerson } from './plan-people';
import { profiles, type LungPattern } from './profiles';
import type { Random } from './random';

/** A person's lungs when first tested, after bronchodilator; volumes in liters. */
export interface Lungs {
  fev1L: number;
  fvcL: number;
  fev1Percent: number;
  /** Null where the equations have no value at this age. */
  tlcL: number | null;
  rvL: number | null;
  dlco: number | null;
  /** Share of FEV1 that a bronchodilator adds. */
  bronchodilatorGain: number;
}

type Measured = Pick<DemoPerson, 'sex' | 'birthDate' | 'heightCm'>;

/** What the published equations predict for this person on a day, or null. */
export function predictedFor(person: Measured, kind: ReferenceKind, measure: MeasureId, on: string): number | null {
  const { sex, heightCm } = person;
  const ageYears = ageAt(person.birthDate, on).decimalYears;
  const found = predict(defaultReferenceSet(kind), measure, { sex, ageYears, heightCm });
  return found.computable ? found.predicted : null;
}

/** Percent of predicted a pattern shows: FVC, FEV1 and TLC. */
function percentsOf(random: Random, pattern: LungPattern): { fvc: number; fev1: number; tlc: number } {
  switch (pattern) {
    case 'obstructive': {
      const fev1 = random.between(27, 76);
      return { fev1, fvc: Math.min(106, fev1 + random.between(20, 34)), tlc: random.between(97, 118) };
    }
    case 'restrictive': {
      const fvc = random.between(46, 70);
      return { fvc, fev1: fvc + random.between(2, 8), tlc: Math.min(74, fvc + random.between(0, 6)) };
    }
    case 'mixed': {
      const fvc = random.between(50, 66);
      return { fvc, fev1: fvc * random.between(0.58, 0.76), tlc: random.between(62, 74) };
    }
    case 'non-specific': {
      const fvc = random.between(59, 69);
      return { fvc, fev1: fvc + random.between(-1, 4), tlc: random.between(89, 104) };
    }
    case 'normal': {
      const fvc = random.between(92, 110);
      return { fvc, fev1: fvc * random.between(0.97, 1.04), tlc: random.between(92, 108) };
    }
  }
}

/** Gives a person lungs that test as their pattern does, from the predicted values of the published equations. */
export function lungsOf(person: DemoPerson, on: string): Lungs {
  const { random } = person;
  const profile = profiles[person.group];
  const percent = percentsOf(random, person.pattern);
  const bronchodilatorGain = random.between(...profile.bronchodilatorGain);
  const part = (share: number, predicted: number | null) => (predicted === null ? null : (share / 100) * predicted);
  const fev1L = part(percent.fev1, predictedFor(person, 'spirometry', 'fev1', on));
  const fvcL = part(percent.fvc, predictedFor(person, 'spirometry', 'fvc', on));
  if (fev1L === null || fvcL === null) throw new RangeError(`No predicted values at the age of ${person.birthDate}`);
  const tlcL = part(percent.tlc, predictedFor(person, 'lung-volumes', 'tlc', on));
  const transfer = profile.transferPercent && random.between(...profile.transferPercent);
  return {
    fev1L,
    // forced capacity a little above FEV1 even in the stiffest lung
    fvcL: Math.max(fvcL, fev1L * 1.08),
    fev1Percent: percent.fev1,
    tlcL,
    // the slow capacity is a little larger than the forced one
    rvL: tlcL === null ? null : Math.max(0.6, tlcL - Math.max(fvcL, fev1L * 1.08) * 1.06),
    dlco: transfer && part(transfer, predictedFor(person, 'transfer-factor', 'dlco', on)),
    bronchodilatorGain,
  };
}
