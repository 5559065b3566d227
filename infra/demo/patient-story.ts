import { ageAt } from '@slighthill/api/physiology/age-at';
import { addDays, daysBetween } from '@slighthill/shared/calendar';
import { clinicInstant, workdayUpTo } from './clinic-instant';
import { enrollmentSteps } from './enrollment-steps';
import { fileStep, referralFile } from './file-steps';
import { lungsOf, type Lungs } from './lungs';
import type { DemoPerson } from './plan-people';
import { profiles } from './profiles';
import { courseEffect, firstWellbeing, wellbeingAt } from './scores';
import { mishapSteps } from './mishap-steps';
import type { Special } from './specials';
import { spirometryBody, type TestStyle } from './spirometry-body';
import type { DemoStep } from './steps';
import { visitSteps, type Visit } from './visit-steps';

export interface StoryFrame {
  today: string;
  timeZone: string;
  physician: string | null;
  programIds: readonly string[];
  special: Special | null;
}

/** All that the clinic wrote down about one patient, oldest first, nothing later than the end of yesterday. */
export function patientStory(person: DemoPerson, frame: StoryFrame): DemoStep[] {
  const { random, addedOn } = person;
  const lungs = lungsOf(person, addedOn);
  const needsOxygen = random.chance(profiles[person.group].oxygenChance);
  const walkingLpm = needsOxygen ? random.whole(1, 4) : 0;
  const oxygen = needsOxygen ? { restLpm: random.chance(0.3) ? 1 : null, walkingLpm, asleepLpm: null } : null;
  const visits = person.standing === 'none' ? [] : visitsOf(person, lungs, walkingLpm, frame);
  const steps = [
    additionStep(person, frame.timeZone),
    ...referralFile(person, { timeZone: frame.timeZone, physician: frame.physician, oxygen }),
    ...outsideReport(person, lungs, frame.timeZone),
    ...enrollmentSteps(person, frame),
    ...visits.flatMap((visit) => visitSteps(person, visit, frame.timeZone)),
  ];
  const all = [...steps, ...mishapSteps(person, steps, visits, frame)];
  const end = clinicInstant(frame.today, 0, frame.timeZone);
  return all.filter((step) => step.at < end).sort((a, b) => a.at.getTime() - b.at.getTime());
}

function additionStep(person: DemoPerson, timeZone: string): DemoStep {
  const { id, givenName, familyName, birthDate, sex, group, random, addedOn } = person;
  const mailbox = `${givenName}.${familyName}`.toLowerCase().replace(/[^a-z.]/g, '');
  return {
    kind: 'patient',
    patientId: id,
    by: 'coordinator',
    at: clinicInstant(addedOn, 9 * 60 + random.whole(0, 50), timeZone),
    body: {
      id,
      givenName,
      familyName,
      birthDate,
      sexForPrediction: sex,
      diagnosisGroup: group,
      recordNumber: null,
      email: random.chance(0.6) ? `${mailbox}@example.test` : null,
      // 555-0100 to 555-0199 are kept free for invented people
      phone: random.chance(0.9) ? `720-555-01${String(random.whole(0, 99)).padStart(2, '0')}` : null,
    },
  };
}

/** A test the referring practice had sent along: best values only, its circumstances often unknown. */
function outsideReport(person: DemoPerson, lungs: Lungs, timeZone: string): DemoStep[] {
  const { random, addedOn, heightCm } = person;
  if (!random.chance(0.45)) return [];
  const style: TestStyle = random.pick(['unknown', 'unknown', 'none', 'after']);
  const body = spirometryBody(random, {
    at: clinicInstant(workdayUpTo(addDays(addedOn, -random.whole(50, 190))), 11 * 60, timeZone),
    style,
    entry: 'best',
    heightCm,
    weightKg: null,
    fev1L: lungs.fev1L * 1.02,
    fvcL: lungs.fvcL * 1.01,
    bronchodilatorGain: lungs.bronchodilatorGain,
    note: 'From the report of the referring practice',
  });
  const at = clinicInstant(addedOn, 14 * 60 + random.whole(0, 59), timeZone);
  const weekBefore = fileStep(
    person,
    { kind: 'exacerbation', on: addDays(addedOn, -12), details: { steroid: true, antibiotic: true, admitted: false } },
    clinicInstant(addedOn, 15 * 60, timeZone),
    'coordinator',
  );
  const recentIllness = person.group === 'copd' && random.chance(0.2) ? [weekBefore] : [];
  return [{ kind: 'spirometry', patientId: person.id, by: 'coordinator', at, body }, ...recentIllness];
}

/** First visit before the course, one on the way, one at the end, for some one half a year later. */
function visitsOf(person: DemoPerson, lungs: Lungs, oxygenLpm: number, frame: StoryFrame): Visit[] {
  const { random, startOn, weeks, standing, addedOn } = person;
  const length = weeks * 7;
  const planned = standing === 'planned';
  const firstOn = workdayUpTo(addDays(planned ? addedOn : startOn, planned ? 5 : -random.whole(2, 9)));
  const dates: { on: string; part: number; extent: Visit['extent'] }[] = [{ on: firstOn, part: 0, extent: 'full' }];
  const add = (days: number, part: number, extent: Visit['extent']) =>
    dates.push({ on: workdayUpTo(addDays(startOn, days)), part, extent });
  if (standing !== 'withdrawn' && standing !== 'paused') add(Math.round(length / 2), 0.5, 'short');
  if (standing === 'completed') add(length - random.whole(0, 2), 1, 'full');
  if (standing === 'partly-completed' && random.chance(0.5)) add(Math.round(length * 0.7), 0.7, 'full');
  if (standing === 'completed' && random.chance(0.35)) add(length + random.whole(150, 190), 0.75, 'short');

  const first = firstWellbeing(person, lungs.fev1Percent, ageAt(person.birthDate, firstOn).decimalYears);
  const effect = courseEffect(person);
  const drift = profiles[person.group].lungDrift[person.course];
  return dates
    .filter(({ on }) => on < frame.today)
    .map(({ on, part, extent }, index, kept) => {
      const isLast = index > 0 && index === kept.length - 1;
      // lungs lose a little every year whatever the course does
      const share = 1 + drift * part - 0.012 * (daysBetween(firstOn, on) / 365.25);
      return {
        on,
        beginsAt: 60 * random.whole(8, 14) + random.pick([0, 15, 30]),
        extent,
        style: random.chance(0.82) ? 'pair' : random.pick(['after', 'before', 'none'] as const),
        entry: random.chance(0.75) ? 'maneuvers' : 'best',
        lungs: scaled(lungs, share, random.chance(index === 0 ? 0.75 : 0.4)),
        wellbeing: wellbeingAt(person, first, effect, part),
        heightCm: person.heightCm - (isLast && frame.special === 'height-measured-again' ? 2 : 0),
        heightMethod: index === 0 && frame.special === 'stated-height' ? 'stated' : 'measured',
        weightKg: Math.round(10 * person.weightKg * (1 + (part ? random.between(-0.025, 0.02) : 0))) / 10,
        oxygenLpm,
        courseM: isLast && frame.special === 'other-course-length' ? 20 : 30,
        item9: item9Of(frame.special, index),
      };
    });
}

function item9Of(special: Special | null, index: number): Visit['item9'] {
  if (index > 0) return '0';
  if (special === 'missing-item9') return 'not-answered';
  return special === 'positive-item9' || special === 'settled-item9' ? '1' : '0';
}

/** The lungs of a later day; not every visit has the volumes measured. */
const scaled = (lungs: Lungs, share: number, withVolumes: boolean): Lungs => ({
  ...lungs,
  fev1L: lungs.fev1L * share,
  fvcL: lungs.fvcL * share,
  tlcL: lungs.tlcL === null || !withVolumes ? null : lungs.tlcL * (1 + (share - 1) / 2),
  dlco: lungs.dlco === null ? null : lungs.dlco * share,
});
