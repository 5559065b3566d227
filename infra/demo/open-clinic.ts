import { AccountLink } from '@slighthill/api/models/account-link';
import { Clinic } from '@slighthill/api/models/clinic';
import type { Patient } from '@slighthill/api/models/patient';
import { User } from '@slighthill/api/models/user';
import type { Actor } from '@slighthill/api/policies/actor';
import type { CommandContext } from '@slighthill/api/services/command-context';
import { addProgram } from '@slighthill/api/services/manage-clinic';
import { addUser } from '@slighthill/api/services/manage-users';
import { programCreate, userCreate } from '@slighthill/shared/contracts/clinic';
import type { StaffRole } from '@slighthill/shared/permissions';
import type { DemoClinic } from './demo-clinics';
import { atMoment } from './demo-time';
import type { OrderedAudit } from './ordered-audit';
import { programs } from './plan-people';
import { createRandom, type Random } from './random';

export interface OpenClinic {
  clinic: Clinic;
  programIds: string[];
  physician: string | null;
  passwordHash: string;
  audit: OrderedAudit;
  /** Patients added so far. */
  patients: Map<string, Patient>;
  /** Who does the work of a role; a small clinic has one person for all of it. */
  actorFor(role: StaffRole): Actor;
}

/** The context of one command: who does it, and a clock that stands at the moment it is done. */
export const contextOf = (audit: OrderedAudit, actor: Actor, action: string, at: Date): CommandContext => ({
  actor,
  clock: { now: () => at },
  audit: audit.trail(actor, action, at),
});

type Means = Pick<OpenClinic, 'passwordHash' | 'audit'>;

/** Makes the clinic, its people with their passwords, and its programs. */
export async function openClinic(
  demo: DemoClinic,
  openedAt: Date,
  { passwordHash, audit }: Means,
): Promise<OpenClinic> {
  return await atMoment(openedAt, async () => {
    const random = createRandom(demo.seed + 77);
    const { id, name, timeZone, phone } = demo;
    const clinic = await Clinic.create({ id, name, timeZone, phone });
    const actors = await makeStaff(demo, clinic, random, openedAt, { passwordHash, audit });
    const physician = demo.staff.find(({ role }) => role === 'pulmonologist');
    const first = [...actors.values()][0]!;
    const actorFor = (role: StaffRole) => actors.get(role) ?? first;
    const programIds: string[] = [];
    for (const program of programs) {
      const body = programCreate.parse({
        ...program,
        id: random.uuid(),
        sessionsPerDay: 1,
        sessionKinds: ['exercise', 'education', 'assessment'],
      });
      const context = contextOf(audit, actorFor('administrator'), 'program.create', openedAt);
      programIds.push((await addProgram(context, body)).row.id);
    }
    return {
      clinic,
      programIds,
      physician: physician?.displayName ?? null,
      passwordHash,
      audit,
      patients: new Map(),
      actorFor,
    };
  });
}

/** The first person comes with the clinic, as in real life; that person adds the others. */
async function makeStaff(
  { staff }: DemoClinic,
  clinic: Clinic,
  random: Random,
  at: Date,
  { passwordHash, audit }: Means,
): Promise<Map<StaffRole, Actor>> {
  const actors = new Map<StaffRole, Actor>();
  for (const { role, ...person } of staff) {
    const id = random.uuid();
    const founder = [...actors.values()][0];
    if (founder) {
      const body = userCreate.parse({ ...person, id, roles: [role] });
      await addUser(contextOf(audit, founder, 'user.create', at), body);
      await AccountLink.update({ usedAt: at }, { where: { userId: id } });
      await User.update({ passwordHash }, { where: { id } });
    } else await User.create({ ...person, id, clinicId: clinic.id, roles: [role], passwordHash });
    actors.set(role, { userId: id, displayName: person.displayName, roles: [role], patientId: null, ...of(clinic) });
  }
  return actors;
}

function of(clinic: Clinic): Pick<Actor, 'clinicId' | 'clinic'> {
  const { id, name, timeZone, phone, ratioRule, fev1SeverityRule, tlcSeverityRule, tlcWindowDays } = clinic;
  return {
    clinicId: id,
    clinic: { name, timeZone, phone, ratioRule, fev1SeverityRule, tlcSeverityRule, tlcWindowDays },
  };
}
