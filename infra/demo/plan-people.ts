import { addDays } from '@slighthill/shared/calendar';
import { diagnosisGroups, type DiagnosisGroup, type EnrollmentStatus } from '@slighthill/shared/contracts/patient';
import type { Sex } from '@slighthill/api/physiology/reference-sets/index';
import { workdayFrom, workdayUpTo } from './clinic-instant';
import { nameSource, type DemoName } from './names';
import { profiles, type LungPattern } from './profiles';
import { createRandom, type Random } from './random';

/** Where a patient stands today; `none` is not enrolled yet. */
export type Standing = EnrollmentStatus | 'none';

/** How a course goes. */
export type Course = 'better' | 'same' | 'worse';

export interface DemoPerson extends DemoName {
  id: string;
  birthDate: string;
  sex: Sex;
  heightCm: number;
  weightKg: number;
  group: DiagnosisGroup;
  pattern: LungPattern;
  course: Course;
  standing: Standing;
  addedOn: string;
  startOn: string;
  programIndex: number;
  weeks: number;
  /** Of this person alone, so that another person more or less changes nothing here. */
  random: Random;
}

/** How many of sixty stand where. */
const standings: readonly (readonly [Standing, number])[] = [
  ['active', 22],
  ['completed', 20],
  ['planned', 5],
  ['paused', 3],
  ['partly-completed', 4],
  ['withdrawn', 4],
  ['none', 2],
];

const courses: readonly (readonly [Course, number])[] = [
  ['better', 30],
  ['same', 18],
  ['worse', 12],
];

export const programs = [
  { name: 'Pulmonary rehabilitation, 12 weeks', plannedSessions: 24, weeks: 12, sessionsPerWeek: 2 },
  { name: 'Interstitial lung disease course, 8 weeks', plannedSessions: 16, weeks: 8, sessionsPerWeek: 2 },
  { name: 'Recovery course, 6 weeks', plannedSessions: 18, weeks: 6, sessionsPerWeek: 3 },
] as const;

const heightsCm: Record<Sex, readonly [number, number]> = { male: [164, 186], female: [150, 173] };

const programOf: Partial<Record<DiagnosisGroup, number>> = {
  ild: 1,
  'pulmonary-hypertension': 1,
  'post-covid': 2,
  'surgery-or-transplant': 2,
};

/** Invents the people of a clinic: who they are and where their course stands on `today`. */
export function planPeople(seed: number, count: number, today: string): DemoPerson[] {
  const random = createRandom(seed);
  const nextName = nameSource(random);
  const groups = deal(
    random,
    diagnosisGroups.map((group) => [group, profiles[group].share] as const),
    count,
  );
  const placed = deal(random, standings, count);
  const courseOf = deal(random, courses, count);
  return groups.map((group, index) =>
    planPerson(createRandom(seed * 1000 + index), today, nextName, {
      group,
      standing: placed[index] ?? 'active',
      course: courseOf[index] ?? 'better',
    }),
  );
}

/** Deals out `count` items in the given shares, in a shuffled order. */
function deal<T>(random: Random, shares: readonly (readonly [T, number])[], count: number): T[] {
  const deck = random.shuffled(shares.flatMap(([item, share]) => Array.from({ length: share }, () => item)));
  return Array.from({ length: count }, (_, index) => deck[index % deck.length] as T);
}

function planPerson(
  random: Random,
  today: string,
  nextName: (sex: Sex) => DemoName,
  lot: Pick<DemoPerson, 'group' | 'standing' | 'course'>,
): DemoPerson {
  const { group, standing } = lot;
  const profile = profiles[group];
  const sex: Sex = random.chance(0.48) ? 'female' : 'male';
  const ageYears = random.between(...profile.ages);
  const heightCm = Math.round(10 * random.between(...heightsCm[sex])) / 10;
  const bodyMassIndex = random.between(20.5, 34);
  const programIndex = programOf[group] ?? 0;
  const weeks = programs[programIndex]?.weeks ?? 12;
  return {
    ...nextName(sex),
    id: random.uuid(),
    birthDate: addDays(today, -Math.round(ageYears * 365.25)),
    sex,
    heightCm,
    weightKg: Math.round(10 * bodyMassIndex * (heightCm / 100) ** 2) / 10,
    ...lot,
    pattern: random.pick(profile.patterns),
    ...datesOf(random, standing, weeks, today),
    programIndex,
    weeks,
    random,
  };
}

function datesOf(random: Random, standing: Standing, weeks: number, today: string) {
  if (standing === 'none' || standing === 'planned') {
    const addedOn = workdayUpTo(addDays(today, -random.whole(10, 24)));
    return { addedOn, startOn: workdayFrom(addDays(today, random.whole(3, 20))) };
  }
  const length = weeks * 7;
  const agoDays = {
    active: random.whole(6, length - 4),
    paused: random.whole(30, length - 4),
    completed: length + random.whole(5, 288),
    'partly-completed': length + random.whole(5, 200),
    withdrawn: random.whole(50, 280),
  }[standing];
  const startOn = workdayUpTo(addDays(today, -agoDays));
  return { addedOn: workdayUpTo(addDays(startOn, -random.whole(18, 40))), startOn };
}
