import { addDays } from '@slighthill/shared/calendar';
import type { FileEntryInput } from '@slighthill/shared/contracts/file-entry';
import type { StaffRole } from '@slighthill/shared/permissions';
import { clinicInstant, workdayFrom } from './clinic-instant';
import type { DemoPerson } from './plan-people';
import { profiles } from './profiles';
import type { DemoStep } from './steps';

export interface FileFacts {
  timeZone: string;
  /** Name with credential, or null in a clinic without a pulmonologist of its own. */
  physician: string | null;
  oxygen: { restLpm: number | null; walkingLpm: number; asleepLpm: number | null } | null;
}

type FilePerson = Pick<DemoPerson, 'id' | 'group' | 'random' | 'addedOn'>;

/** One entry of the record's file. */
export function fileStep(person: FilePerson, body: FileEntryInput, at: Date, by: StaffRole): DemoStep {
  return { kind: 'file-entry', patientId: person.id, at, by, body: { id: person.random.uuid(), ...body } };
}

/** What the referral brings into the file: diagnosis, smoking, medicines, exacerbations, oxygen. */
export function referralFile(person: FilePerson, facts: FileFacts): DemoStep[] {
  const { random, addedOn } = person;
  const profile = profiles[person.group];
  let minutes = 10 * 60 + random.whole(0, 40);
  const next = () => clinicInstant(addedOn, (minutes += random.whole(2, 5)), facts.timeZone);
  const entry = (body: FileEntryInput) => fileStep(person, body, next(), 'coordinator');
  const status = random.pick(profile.smoking);
  const smoking = entry({
    kind: 'smoking',
    on: addedOn,
    details: {
      status,
      packYears: status === 'never' ? null : random.whole(8, 55),
      quitOn: status === 'former' ? addDays(addedOn, -random.whole(400, 6000)) : null,
    },
  });
  const medicines = random
    .shuffled(profile.medicines)
    .slice(0, 2)
    .map((details) => entry({ kind: 'medicine', on: addDays(addedOn, -random.whole(60, 900)), details }));
  const fibrillation = random.chance(0.12)
    ? [entry({ kind: 'heart-rhythm', on: addedOn, details: { atrialFibrillation: true } })]
    : [];
  return [
    smoking,
    ...medicines,
    ...fibrillation,
    ...exacerbations(person, entry),
    ...confirmation(person, facts),
    ...oxygenOrder(person, facts),
  ];
}

function exacerbations(person: FilePerson, entry: (body: FileEntryInput) => DemoStep): DemoStep[] {
  const { random, addedOn } = person;
  if (!random.chance(profiles[person.group].exacerbationChance)) return [];
  return Array.from({ length: random.whole(1, 2) }, () =>
    entry({
      kind: 'exacerbation',
      on: addDays(addedOn, -random.whole(15, 330)),
      details: { steroid: random.chance(0.8), antibiotic: random.chance(0.6), admitted: random.chance(0.25) },
    }),
  );
}

function confirmation(person: FilePerson, { physician, timeZone }: FileFacts): DemoStep[] {
  const { random, addedOn, group } = person;
  if (physician === null || !random.chance(0.8)) return [];
  const on = workdayFrom(addDays(addedOn, 1));
  const description = random.pick(profiles[group].descriptions);
  const details = { diagnosisGroup: group, description, confirmedBy: physician };
  const at = clinicInstant(on, 17 * 60 + random.whole(0, 40), timeZone);
  return [fileStep(person, { kind: 'diagnosis', on, details }, at, 'pulmonologist')];
}

/** The clinic's own orders are a pulmonologist's; any other staff records what an outside order says. */
function oxygenOrder(person: FilePerson, { oxygen, physician, timeZone }: FileFacts): DemoStep[] {
  if (!oxygen) return [];
  const { random, addedOn } = person;
  const outside = physician === null || random.chance(0.4);
  const on = outside ? addedOn : workdayFrom(addDays(addedOn, 1));
  const prescriber = outside ? 'Dr. R. Halvane, Copper Ridge Medical Group' : (physician ?? '');
  const details = { ...oxygen, device: 'portable-concentrator' as const, prescriber, outside };
  const at = clinicInstant(on, (outside ? 11 : 17) * 60 + 45, timeZone);
  return [fileStep(person, { kind: 'oxygen-order', on, details }, at, outside ? 'coordinator' : 'pulmonologist')];
}
