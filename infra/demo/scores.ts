import type { DemoPerson } from './plan-people';
import { profiles } from './profiles';

/** How a person is on one visit, as the tests that are not of the lung see it. */
export interface Wellbeing {
  walkM: number;
  mmrc: number;
  cat: number;
  borgBreathlessness: number;
  borgLegs: number;
  phq9: number;
  gad7: number;
  spo2Nadir: number;
  sitToStand: number;
}

const clamp = (value: number, min: number, max: number) => Math.round(Math.min(max, Math.max(min, value)));

/** How a person is before the course. */
export function firstWellbeing(person: DemoPerson, fev1Percent: number, ageYears: number): Wellbeing {
  const { random } = person;
  const burden = Math.max(0, 85 - fev1Percent);
  const heart = person.group === 'pulmonary-hypertension' ? 50 : 0;
  const walkM = clamp(505 - 2.4 * (ageYears - 50) - 2.2 * burden - heart + random.between(-45, 45), 130, 560);
  const breathless = walkM < 230 ? 4 : walkM < 320 ? 3 : walkM < 430 ? 2 : 1;
  return {
    walkM,
    mmrc: breathless,
    cat: clamp(9 + burden * 0.18 + random.between(0, 8), 6, 34),
    borgBreathlessness: clamp(2 + breathless + random.between(-1, 1), 2, 7),
    borgLegs: random.whole(2, 5),
    phq9: random.whole(2, 15),
    gad7: random.whole(1, 12),
    spo2Nadir: random.whole(...profiles[person.group].spo2Nadir),
    sitToStand: clamp(walkM / 19 + random.between(-2, 2), 6, 34),
  };
}

/** What a whole course does, by how it goes; a part of it is done at a visit on the way. */
export function courseEffect(person: DemoPerson): Wellbeing {
  const { random } = person;
  const by = <T>(better: T, same: T, worse: T): T => ({ better, same, worse })[person.course];
  return {
    walkM: by(random.between(35, 78), random.between(-13, 20), random.between(-62, -33)),
    mmrc: by(-1, 0, 1),
    cat: by(random.between(-8, -3), random.between(-1, 1), random.between(2, 5)),
    borgBreathlessness: by(-1, 0, 1),
    borgLegs: by(-1, 0, 0),
    phq9: by(random.between(-5, -2), random.between(-1, 1), random.between(1, 4)),
    gad7: by(random.between(-4, -1), random.between(-1, 1), random.between(0, 3)),
    spo2Nadir: by(1, 0, -2),
    sitToStand: by(random.between(3, 6), random.between(-1, 1), random.between(-3, -1)),
  };
}

/** The state `part` of the way through the course, 0 to 1, with the small scatter of any day. */
export function wellbeingAt(person: DemoPerson, first: Wellbeing, effect: Wellbeing, part: number): Wellbeing {
  const scatter = part === 0 ? 0 : person.random.between(-4, 4);
  const grade = (key: 'mmrc' | 'borgBreathlessness' | 'borgLegs') => first[key] + (part >= 0.7 ? effect[key] : 0);
  return {
    walkM: clamp(first.walkM + effect.walkM * part + scatter, 60, 640),
    mmrc: clamp(grade('mmrc'), 0, 4),
    cat: clamp(first.cat + effect.cat * part, 2, 38),
    borgBreathlessness: clamp(grade('borgBreathlessness'), 1, 9),
    borgLegs: clamp(grade('borgLegs'), 1, 9),
    phq9: clamp(first.phq9 + effect.phq9 * part, 0, 25),
    gad7: clamp(first.gad7 + effect.gad7 * part, 0, 20),
    spo2Nadir: clamp(first.spo2Nadir + effect.spo2Nadir * part, 76, 98),
    sitToStand: clamp(first.sitToStand + effect.sitToStand * part, 3, 40),
  };
}
