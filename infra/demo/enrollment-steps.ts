import { addDays } from '@slighthill/shared/calendar';
import type { EnrollmentPatch } from '@slighthill/shared/contracts/patient';
import { clinicInstant, workdayUpTo } from './clinic-instant';
import type { DemoPerson } from './plan-people';
import type { DemoStep } from './steps';

interface EnrollmentFrame {
  timeZone: string;
  programIds: readonly string[];
}

const reasons = {
  paused: ['Admitted with pneumonia', 'Caring for a family member', 'Chest infection, on antibiotics'],
  'partly-completed': ['Moved away', 'Went back to work', 'Transport no longer possible'],
  withdrawn: ['Prefers exercise at home', 'Too ill to travel', 'Insurance changed'],
} as const;

/** Enrollment, first session, and how the course was paused or ended. */
export function enrollmentSteps(person: DemoPerson, { timeZone, programIds }: EnrollmentFrame): DemoStep[] {
  const { random, standing, addedOn, startOn } = person;
  if (standing === 'none') return [];
  const id = random.uuid();
  const enrolledOn = workdayUpTo(addDays(addedOn, 3));
  const step = (on: string, minutes: number, changes: Omit<EnrollmentPatch, 'version'>): DemoStep => ({
    kind: 'enrollment-change',
    patientId: person.id,
    by: 'coordinator',
    at: clinicInstant(on, minutes, timeZone),
    id,
    changes,
  });
  const enrolled: DemoStep = {
    kind: 'enrollment',
    patientId: person.id,
    by: 'coordinator',
    // never before the patient was added, when a weekend pulled the day back
    at: clinicInstant(enrolledOn > addedOn ? enrolledOn : addedOn, 16 * 60 + random.whole(0, 30), timeZone),
    body: { id, programId: programIds[person.programIndex] ?? programIds[0]!, startOn, consentOn: addedOn },
  };
  if (standing === 'planned') return [enrolled];
  const steps = [enrolled, step(startOn, 15 * 60 + random.whole(30, 59), { status: 'active' })];
  if (standing === 'active') return steps;
  const reason = standing === 'completed' ? undefined : random.pick(reasons[standing]);
  return [...steps, step(endOf(person), 16 * 60 + 40, { status: standing, ...(reason ? { reason } : {}) })];
}

/** The day a course was paused or ended. */
function endOf({ random, standing, startOn, weeks }: DemoPerson): string {
  const days = {
    completed: weeks * 7,
    'partly-completed': Math.round(weeks * 7 * 0.75),
    paused: random.whole(12, 26),
    withdrawn: random.whole(8, 30),
  }[standing as 'completed' | 'partly-completed' | 'paused' | 'withdrawn'];
  return workdayUpTo(addDays(startOn, days));
}
