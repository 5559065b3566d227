import type { Role } from '@slighthill/shared/permissions';
import { randomUUID } from 'node:crypto';
import { Clinic } from '../../models/clinic';
import { Program } from '../../models/program';
import { User } from '../../models/user';
import type { Client, TestServer } from '../server';
import { makePatient } from './patient';

export type StaffClients = Record<Exclude<Role, 'patient'>, Client>;

export interface TestClinic {
  clinic: Clinic;
  users: Record<Role, User>;
  as: Record<Role, Client>;
  program: Program;
}

export async function makeUser(clinicId: string, roles: Role[], extra: Partial<User> = {}): Promise<User> {
  const id = randomUUID();
  return await User.create({
    id,
    clinicId,
    email: `${roles[0]}-${id}@clinic.test`,
    displayName: `Test ${roles[0]}`,
    roles,
    ...(extra as object),
  });
}

/** A clinic of a test's own, one person a role, each signed in. */
export async function makeClinic(server: TestServer, timeZone = 'America/Denver'): Promise<TestClinic> {
  const clinic = await Clinic.create({ id: randomUUID(), name: 'Test clinic', timeZone });
  const program = await Program.create({
    id: randomUUID(),
    clinicId: clinic.id,
    name: 'Standard course',
    plannedSessions: 24,
    weeks: 12,
    sessionsPerDay: 1,
    sessionsPerWeek: 2,
    sessionKinds: ['exercise', 'education'],
  });
  const owner = await makePatient(clinic.id, { givenName: 'Own', familyName: 'Record' });
  const users = {
    administrator: await makeUser(clinic.id, ['administrator']),
    coordinator: await makeUser(clinic.id, ['coordinator']),
    therapist: await makeUser(clinic.id, ['therapist']),
    pulmonologist: await makeUser(clinic.id, ['pulmonologist']),
    patient: await makeUser(clinic.id, ['patient'], { patientId: owner.id }),
  };
  const as = {
    administrator: await server.signedIn(users.administrator.id),
    coordinator: await server.signedIn(users.coordinator.id),
    therapist: await server.signedIn(users.therapist.id),
    pulmonologist: await server.signedIn(users.pulmonologist.id),
    patient: await server.signedIn(users.patient.id),
  };
  return { clinic, users, as, program };
}
