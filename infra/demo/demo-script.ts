import { clinicDate } from '@slighthill/api/time/clinic-time';
import { alderFalls, stonebridge, stonebridgePatients } from './demo-clinics';
import type { OpenClinic } from './open-clinic';
import { patientStory, type StoryFrame } from './patient-story';
import { planPeople, type DemoPerson } from './plan-people';
import { showcaseStory } from './showcase-story';
import { assignSpecials, type Special } from './specials';
import type { DemoStep } from './steps';

export interface ScriptLine {
  clinic: OpenClinic;
  step: DemoStep;
}

/** The first clinic's story. The patient of the demo account is one of the count. */
export function mainScript(clinic: OpenClinic, patients: number, now: Date): ScriptLine[] {
  const frame = frameOf(clinic, now);
  const showcase = showcaseStory(alderFalls.seed - 1, frame).steps.map((step) => ({ clinic, step }));
  const people = planPeople(alderFalls.seed, patients - 1, frame.today);
  return [...showcase, ...linesOf(clinic, people, frame, assignSpecials(people))];
}

/** The second clinic is small and nothing goes wrong in it. */
export function secondScript(clinic: OpenClinic, now: Date): ScriptLine[] {
  const frame = frameOf(clinic, now);
  return linesOf(clinic, planPeople(stonebridge.seed, stonebridgePatients, frame.today), frame, new Map());
}

const linesOf = (
  clinic: OpenClinic,
  people: readonly DemoPerson[],
  frame: StoryFrame,
  specials: ReadonlyMap<string, Special>,
): ScriptLine[] =>
  people.flatMap((person) =>
    patientStory(person, { ...frame, special: specials.get(person.id) ?? null }).map((step) => ({ clinic, step })),
  );

function frameOf({ clinic, programIds, physician }: OpenClinic, now: Date): StoryFrame {
  const { timeZone } = clinic;
  return { today: clinicDate(now, timeZone), timeZone, physician, programIds, special: null };
}
