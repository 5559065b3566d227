import { addDays } from '@slighthill/shared/calendar';
import type { SafetyItemId } from '@slighthill/shared/safety-checklist';
import { clinicInstant } from './clinic-instant';
import { fileStep } from './file-steps';
import type { DemoPerson } from './plan-people';
import type { Special } from './specials';
import type { DemoStep, StepAction } from './steps';
import type { Visit } from './visit-steps';

interface MishapFrame {
  today: string;
  timeZone: string;
  special: Special | null;
}

type Moment = (action: StepAction, daysLater: number, by?: DemoStep['by']) => DemoStep;

/** What went wrong and was put right, or waits to be: amendments, voided entries, holds, a flag that was closed. */
export function mishapSteps(
  person: DemoPerson,
  steps: readonly DemoStep[],
  visits: readonly Visit[],
  frame: MishapFrame,
): DemoStep[] {
  const { special, today, timeZone } = frame;
  const first = visits[0];
  if (!special || !first) return [];
  const yesterday = addDays(today, -1);
  const later: Moment = (action, days, by = 'therapist') => {
    const on = addDays(first.on, days) < today ? addDays(first.on, days) : yesterday;
    // half past seven in the evening: after every visit of the day
    return { ...action, patientId: person.id, by, at: clinicInstant(on, 19 * 60 + 30, timeZone) };
  };
  const walk = steps.find((step) => step.kind === 'measurement' && step.body.measure === 'sixMinuteWalkDistance');
  const test = steps.find((step) => step.kind === 'spirometry' && step.by === 'therapist');
  if (special === 'amended-walk' && walk?.kind === 'measurement') {
    return [later({ ...correction(walk.body.id!), value: walk.body.value + 10 }, 1)];
  }
  if (special === 'amended-spirometry' && test?.kind === 'spirometry') {
    const id = 'tests' in test.body ? test.body.tests[0].id! : test.body.id!;
    const changes = { ownBronchodilatorHoursAgo: 4 };
    const reason = 'The patient had used the inhaler in the morning after all';
    return [later({ kind: 'spirometry-amend', id, reason, changes }, 1)];
  }
  if (special === 'voided-duplicate' && walk?.kind === 'measurement') return duplicate(person, walk, later);
  if (special === 'voided-wrong-patient') return wrongPatient(person, first, frame, later);
  if (special === 'settled-item9') {
    const note = 'Spoke with the patient the same day. No plan, no intent; the family doctor was told.';
    return [later({ kind: 'flag-resolve', note }, 0, 'pulmonologist')];
  }
  return holdSteps(person, special, first, frame, later);
}

const correction = (id: string) =>
  ({ kind: 'measurement-amend', id, reason: 'One length of the course was not counted' }) as const;

function duplicate(person: DemoPerson, walk: DemoStep & { kind: 'measurement' }, later: Moment): DemoStep[] {
  const id = person.random.uuid();
  const again: DemoStep = { ...walk, at: new Date(walk.at.getTime() + 15 * 60_000), body: { ...walk.body, id } };
  return [again, later({ kind: 'measurement-void', id, body: { reason: 'duplicate', text: null } }, 0)];
}

function wrongPatient(person: DemoPerson, first: Visit, { timeZone }: MishapFrame, later: Moment): DemoStep[] {
  const id = person.random.uuid();
  const performedAt = clinicInstant(first.on, 17 * 60, timeZone);
  const strange: DemoStep = {
    kind: 'spirometry',
    patientId: person.id,
    by: 'therapist',
    at: clinicInstant(first.on, 17 * 60 + 12, timeZone),
    body: {
      id,
      visitId: person.random.uuid(),
      performedAt: performedAt.toISOString(),
      heightCm: first.heightCm,
      bronchodilator: 'after',
      drug: 'Albuterol',
      doseMcg: 400,
      minutesSinceDose: 15,
      best: { fev1: 3.42, fvc: 4.31 },
    },
  };
  const text = 'Belongs to the patient who came after';
  return [strange, later({ kind: 'spirometry-void', id, body: { reason: 'wrong-patient', text } }, 0)];
}

const holdItems: Partial<Record<Special, SafetyItemId>> = {
  'hold-released': 'rest-blood-pressure',
  'hold-open-in-course': 'acute-illness',
  'hold-open-before-course': 'fast-or-slow-rhythm',
};

function holdSteps(
  person: DemoPerson,
  special: Special,
  first: Visit,
  { timeZone }: MishapFrame,
  later: Moment,
): DemoStep[] {
  const item = holdItems[special];
  if (!item) return [];
  const at = clinicInstant(first.on, 18 * 60, timeZone);
  const hold = fileStep(person, { kind: 'safety-hold', on: first.on, details: { item } }, at, 'therapist');
  if (special !== 'hold-released' || hold.kind !== 'file-entry') return [hold];
  const reason = 'Pressure 142 over 84 on two visits after the dose was changed';
  return [hold, later({ kind: 'hold-release', id: hold.body.id!, reason }, 2, 'pulmonologist')];
}
