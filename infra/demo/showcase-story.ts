import { addDays } from '@slighthill/shared/calendar';
import type { FileEntryInput } from '@slighthill/shared/contracts/file-entry';
import type { StaffRole } from '@slighthill/shared/permissions';
import { clinicInstant, workdayUpTo } from './clinic-instant';
import { fileStep } from './file-steps';
import type { Lungs } from './lungs';
import type { StoryFrame } from './patient-story';
import { createRandom } from './random';
import type { Wellbeing } from './scores';
import { spirometryBody, type TestStyle } from './spirometry-body';
import type { DemoStep } from './steps';
import { visitSteps, type Visit } from './visit-steps';

export const showcaseEmail = 'patient@alderfalls.test';
const heightCm = 173;
const startedDaysAgo = 42;

/** Days ago and how the patient was: before the course, halfway, this week. */
const visits: readonly {
  daysAgo: number;
  extent: Visit['extent'];
  fev1L: number;
  fvcL: number;
  weightKg: number;
  tlcL: number;
  rvL: number;
  wellbeing: Omit<Wellbeing, 'sitToStand'>;
}[] = [
  {
    daysAgo: 52,
    extent: 'full',
    fev1L: 1.31,
    fvcL: 2.74,
    weightKg: 81.4,
    tlcL: 7.44,
    rvL: 4.33,
    wellbeing: score({ walkM: 318, mmrc: 3, cat: 24, borgBreathlessness: 6, phq9: 9, spo2Nadir: 86 }),
  },
  {
    daysAgo: 23,
    extent: 'short',
    fev1L: 1.34,
    fvcL: 2.78,
    weightKg: 80.9,
    tlcL: 7.44,
    rvL: 4.33,
    wellbeing: score({ walkM: 341, mmrc: 3, cat: 20, borgBreathlessness: 5, phq9: 7, spo2Nadir: 87 }),
  },
  {
    daysAgo: 2,
    extent: 'full',
    fev1L: 1.37,
    fvcL: 2.83,
    weightKg: 80.2,
    tlcL: 7.37,
    rvL: 4.21,
    wellbeing: score({ walkM: 364, mmrc: 2, cat: 18, borgBreathlessness: 4, phq9: 5, spo2Nadir: 88 }),
  },
];

function score(own: Pick<Wellbeing, 'walkM' | 'mmrc' | 'cat' | 'borgBreathlessness' | 'phq9' | 'spo2Nadir'>) {
  return { ...own, borgLegs: 3, gad7: Math.round(own.phq9 * 0.7) };
}

/** The patient behind the demo account: confirmed COPD, a course in progress, tests before, at the start and since. */
export function showcaseStory(seed: number, frame: StoryFrame): { patientId: string; steps: DemoStep[] } {
  const random = createRandom(seed);
  const id = random.uuid();
  const dayAgo = (days: number) => workdayUpTo(addDays(frame.today, -days));
  const at = (daysAgo: number, minutes: number) => clinicInstant(dayAgo(daysAgo), minutes, frame.timeZone);
  const person = { id, group: 'copd' as const, random };
  const enrollmentId = random.uuid();
  const own = { patientId: id, by: 'coordinator' as const };
  const birthDate = addDays(frame.today, -Math.round(68.3 * 365.25));
  const steps: DemoStep[] = [
    {
      ...own,
      kind: 'patient',
      at: at(75, 9 * 60 + 12),
      body: {
        id,
        givenName: 'Warren',
        familyName: 'Tidewell',
        birthDate,
        sexForPrediction: 'male',
        diagnosisGroup: 'copd',
        recordNumber: null,
        email: showcaseEmail,
        phone: '720-555-0147',
      },
    },
    ...file({ ...person, addedOn: dayAgo(75) }, frame, dayAgo),
    ...earlierTests(person, at),
    {
      ...own,
      kind: 'enrollment',
      at: at(70, 11 * 60),
      body: {
        id: enrollmentId,
        programId: frame.programIds[0]!,
        startOn: dayAgo(startedDaysAgo),
        consentOn: dayAgo(70),
      },
    },
    { ...own, kind: 'account', at: at(70, 11 * 60 + 5), id: random.uuid(), email: showcaseEmail },
    {
      ...own,
      kind: 'enrollment-change',
      at: at(startedDaysAgo, 15 * 60 + 40),
      id: enrollmentId,
      changes: { status: 'active' },
    },
    ...visits.flatMap((visit, index) =>
      visitSteps(
        person,
        { ...visit, ...constant(visit), on: dayAgo(visit.daysAgo), entry: index === 1 ? 'best' : 'maneuvers' },
        frame.timeZone,
      ),
    ),
  ];
  return { patientId: id, steps: steps.sort((a, b) => a.at.getTime() - b.at.getTime()) };
}

function constant({ fev1L, fvcL, tlcL, rvL, wellbeing }: (typeof visits)[number]) {
  const lungs: Lungs = {
    fev1L,
    fvcL,
    fev1Percent: 44,
    tlcL,
    rvL,
    dlco: null,
    bronchodilatorGain: 0.07,
  };
  return {
    lungs,
    wellbeing: { ...wellbeing, sitToStand: 16 },
    beginsAt: 9 * 60 + 30,
    style: 'pair' as const,
    heightCm,
    heightMethod: 'measured' as const,
    oxygenLpm: 2,
    courseM: 30,
    item9: '0' as const,
  };
}

/** Two tests from before the course: one whose circumstances nobody wrote down, one before bronchodilator only. */
function earlierTests(
  { id, random }: { id: string; random: ReturnType<typeof createRandom> },
  at: (daysAgo: number, minutes: number) => Date,
): DemoStep[] {
  const test = (daysAgo: number, style: TestStyle, fev1L: number, fvcL: number, note: string): DemoStep => ({
    kind: 'spirometry',
    patientId: id,
    by: 'coordinator',
    at: at(75, 10 * 60 + (style === 'before' ? 40 : 45)),
    body: spirometryBody(random, {
      at: at(daysAgo, 10 * 60),
      style,
      entry: 'best',
      heightCm,
      weightKg: null,
      fev1L,
      fvcL,
      bronchodilatorGain: 0.07,
      note,
    }),
  });
  return [
    test(240, 'before', 1.33, 2.8, 'From the report of the referring practice'),
    test(155, 'unknown', 1.33, 2.76, 'Hospital letter; it does not say whether a bronchodilator was given'),
  ];
}

type FilePerson = Parameters<typeof fileStep>[0];

function file(person: FilePerson, { physician, timeZone }: StoryFrame, dayAgo: (days: number) => string): DemoStep[] {
  const entry = (daysAgo: number, minutes: number, body: FileEntryInput, by: StaffRole = 'coordinator') =>
    fileStep(person, body, clinicInstant(dayAgo(daysAgo), minutes, timeZone), by);
  const confirmed = { diagnosisGroup: 'copd', description: 'COPD with emphysema', confirmedBy: physician } as const;
  const oxygen = {
    restLpm: null,
    walkingLpm: 2,
    asleepLpm: null,
    device: 'portable-concentrator',
    prescriber: physician ?? '',
    outside: false,
  } as const;
  const exacerbation = { steroid: true, antibiotic: true, admitted: false };
  const smoking = { status: 'former', packYears: 42, quitOn: addDays(dayAgo(75), -1900) } as const;
  const albuterol = { name: 'Albuterol inhaler', medicineClass: 'short-acting-beta-agonist' } as const;
  const tiotropium = { name: 'Tiotropium', medicineClass: 'long-acting-antimuscarinic' } as const;
  return [
    entry(75, 10 * 60, { kind: 'smoking', on: dayAgo(75), details: smoking }),
    entry(75, 10 * 60 + 4, { kind: 'medicine', on: dayAgo(900), details: albuterol }),
    entry(75, 10 * 60 + 6, { kind: 'medicine', on: dayAgo(640), details: tiotropium }),
    entry(75, 10 * 60 + 9, { kind: 'exacerbation', on: dayAgo(232), details: exacerbation }),
    entry(74, 17 * 60, { kind: 'diagnosis', on: dayAgo(74), details: confirmed }, 'pulmonologist'),
    entry(52, 17 * 60 + 20, { kind: 'oxygen-order', on: dayAgo(52), details: oxygen }, 'pulmonologist'),
  ];
}
