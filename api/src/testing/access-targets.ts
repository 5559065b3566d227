import { hashPassword } from '../auth/passwords';
import { inTransaction } from '../db/in-transaction';
import type { User } from '../models/user';
import { issueInvitation } from '../services/invitations';
import { patientBody, spirometryBody, walkBody } from './factories/bodies';
import { makeUser, type TestClinic } from './factories/clinic';
import {
  addBodySize,
  addEnrollment,
  addFileEntry,
  addFlag,
  addMeasurement,
  addPatient,
  addSpirometry,
  fileBody,
  newId,
} from './factories/scene';
import type { TestServer } from './server';

export interface Target {
  path: string;
  body?: object;
}

export interface Stage {
  server: TestServer;
  clinic: TestClinic;
  /** Whose record the request is about. */
  patientId: string;
}

type Prepare = (stage: Stage) => Promise<Target> | Target;

const password = 'a password long enough';
let passwordHash: Promise<string> | undefined;

async function invited({ server, clinic }: Stage): Promise<{ user: User; token: string }> {
  const user = await makeUser(clinic.clinic.id, ['therapist']);
  const { token } = await inTransaction(() => issueInvitation(user.id, server.clock.now()));
  return { user, token };
}

/** A staff account of the clinic that no other step of a test depends on. */
const spareUser = ({ clinic }: Stage) => makeUser(clinic.clinic.id, ['therapist']);

const about = (path: string, body?: object): Prepare => {
  return ({ patientId }) => ({ path: `/api/patients/${patientId}${path}`, ...(body ? { body } : {}) });
};

const change = { version: 1, reason: 'Typed wrong' };
const voiding = { version: 1, reason: 'duplicate' };

async function closeOpenEnrollment({ clinic, patientId }: Stage): Promise<void> {
  const { coordinator } = clinic.as;
  const { items } = (await coordinator.get(`/api/patients/${patientId}/enrollments`)).body;
  for (const { id, version, endedOn } of items)
    if (endedOn === null)
      await coordinator.patch(`/api/enrollments/${id}`, { version, status: 'withdrawn', reason: 'Moved' }).expect(200);
}

const ofSpirometry =
  (rest: string, body?: object): Prepare =>
  async ({ clinic, patientId }) => {
    const { id } = await addSpirometry(clinic, patientId);
    return { path: `/api/spirometry-tests/${id}${rest}`, ...(body ? { body } : {}) };
  };
const ofMeasurement =
  (rest: string, body?: object): Prepare =>
  async ({ clinic, patientId }) => {
    const { id } = await addMeasurement(clinic, patientId);
    return { path: `/api/measurements/${id}${rest}`, ...(body ? { body } : {}) };
  };
const ofBodySize =
  (rest: string, body?: object): Prepare =>
  async ({ clinic, patientId }) => {
    const { id } = await addBodySize(clinic, patientId);
    return { path: `/api/body-sizes/${id}${rest}`, ...(body ? { body } : {}) };
  };
const ofFileEntry =
  (rest: string, body?: object, entry?: object): Prepare =>
  async ({ clinic, patientId }) => {
    const { id } = await addFileEntry(clinic, patientId, entry);
    return { path: `/api/file-entries/${id}${rest}`, ...(body ? { body } : {}) };
  };

/** A request to each route that is right in everything but, perhaps, who sends it. */
export const accessTargets: Record<string, Prepare> = {
  'get /api/health': () => ({ path: '/api/health' }),
  'get /api/health/ready': () => ({ path: '/api/health/ready' }),
  'post /api/auth/sign-in': async (stage) => {
    passwordHash ??= hashPassword(password);
    const user = await makeUser(stage.clinic.clinic.id, ['therapist'], { passwordHash: await passwordHash });
    return { path: '/api/auth/sign-in', body: { email: user.email, password } };
  },
  'post /api/auth/sign-out': () => ({ path: '/api/auth/sign-out' }),
  'get /api/auth/me': () => ({ path: '/api/auth/me' }),
  'post /api/auth/activity': () => ({ path: '/api/auth/activity' }),
  'post /api/auth/invitation/look-up': async (stage) => ({
    path: '/api/auth/invitation/look-up',
    body: { token: (await invited(stage)).token },
  }),
  'post /api/auth/invitation/accept': async (stage) => ({
    path: '/api/auth/invitation/accept',
    body: { token: (await invited(stage)).token, password },
  }),

  'get /api/clinic': () => ({ path: '/api/clinic' }),
  'patch /api/clinic': () => ({ path: '/api/clinic', body: { version: 1 } }),
  'get /api/users': () => ({ path: '/api/users' }),
  'post /api/users': () => ({
    path: '/api/users',
    body: { displayName: 'New person', email: `${newId()}@clinic.test`, roles: ['therapist'] },
  }),
  'patch /api/users/:id': async (stage) => ({
    path: `/api/users/${(await spareUser(stage)).id}`,
    body: { version: 1, displayName: 'Renamed' },
  }),
  'post /api/users/:id/invitation': async (stage) => ({ path: `/api/users/${(await spareUser(stage)).id}/invitation` }),
  'get /api/programs': () => ({ path: '/api/programs' }),
  'post /api/programs': () => ({
    path: '/api/programs',
    body: {
      name: `Course ${newId()}`,
      plannedSessions: 16,
      weeks: 8,
      sessionsPerDay: 1,
      sessionsPerWeek: 2,
      sessionKinds: ['exercise'],
    },
  }),
  'patch /api/programs/:id': ({ clinic }) => ({ path: `/api/programs/${clinic.program.id}`, body: { version: 1 } }),
  'get /api/audit-events': () => ({ path: '/api/audit-events' }),

  'get /api/patients': () => ({ path: '/api/patients' }),
  'post /api/patients': () => ({ path: '/api/patients', body: patientBody() }),
  'post /api/patients/duplicate-check': () => ({
    path: '/api/patients/duplicate-check',
    body: { givenName: 'Own', familyName: 'Record', birthDate: '1959-03-02' },
  }),
  'get /api/patients/:id': about(''),
  'patch /api/patients/:id': async ({ clinic }) => ({
    path: `/api/patients/${await addPatient(clinic)}`,
    body: { version: 1, phone: '555-0100' },
  }),
  'get /api/patients/:id/enrollments': about('/enrollments'),
  'post /api/patients/:id/enrollments': async (stage) => {
    await closeOpenEnrollment(stage);
    const body = { programId: stage.clinic.program.id, startOn: '2026-05-04' };
    return { path: `/api/patients/${stage.patientId}/enrollments`, body };
  },
  'patch /api/enrollments/:id': async (stage) => {
    await closeOpenEnrollment(stage);
    const { id } = await addEnrollment(stage.clinic, stage.patientId);
    return { path: `/api/enrollments/${id}`, body: { version: 1, consentOn: '2026-03-01' } };
  },
  'post /api/flags/:id/resolve': async (stage) => {
    const { id, version } = await addFlag(stage.clinic, stage.patientId);
    return { path: `/api/flags/${id}/resolve`, body: { version, note: 'Called; safe today' } };
  },

  'get /api/patients/:id/tests': about('/tests'),
  'get /api/patients/:id/spirometry-tests': about('/spirometry-tests'),
  'post /api/patients/:id/spirometry-tests': about('/spirometry-tests', spirometryBody()),
  'get /api/spirometry-tests/:id': ofSpirometry(''),
  'post /api/spirometry-tests/:id/amend': ofSpirometry('/amend', { ...change, best: { fev1: 1.4, fvc: 2.8 } }),
  'post /api/spirometry-tests/:id/void': ofSpirometry('/void', voiding),
  'get /api/patients/:id/measurements': about('/measurements'),
  'post /api/patients/:id/measurements': about('/measurements', walkBody(310)),
  'get /api/measurements/:id': ofMeasurement(''),
  'post /api/measurements/:id/amend': ofMeasurement('/amend', { ...change, value: 320 }),
  'post /api/measurements/:id/void': ofMeasurement('/void', voiding),
  'get /api/patients/:id/body-sizes': about('/body-sizes'),
  'post /api/patients/:id/body-sizes': about('/body-sizes', { takenAt: '2026-06-01T15:00:00Z', weightKg: 80 }),
  'get /api/body-sizes/:id': ofBodySize(''),
  'post /api/body-sizes/:id/amend': ofBodySize('/amend', { ...change, weightKg: 81 }),
  'post /api/body-sizes/:id/void': ofBodySize('/void', voiding),

  'get /api/patients/:id/file-entries': about('/file-entries'),
  'post /api/patients/:id/file-entries': about('/file-entries', fileBody('smoking', { status: 'never' })),
  'get /api/file-entries/:id': ofFileEntry(''),
  'post /api/file-entries/:id/amend': ofFileEntry('/amend', { ...change, note: 'Corrected' }),
  'post /api/file-entries/:id/void': ofFileEntry('/void', voiding),
  'post /api/file-entries/:id/release': ofFileEntry(
    '/release',
    { version: 1, reason: 'Cleared by cardiology' },
    fileBody('safety-hold', { item: 'faint' }),
  ),

  'post /api/predictions': () => ({
    path: '/api/predictions',
    body: { referenceSet: 'gli-global-2022', sex: 'male', ageYears: 67, heightCm: 174.5, values: { fev1: 1.32 } },
  }),
  'get /api/patients/:id/trends': about('/trends?measures=fev1'),

  'get /api/drafts/:form/:subject': ({ patientId }) => ({ path: `/api/drafts/spirometry/${patientId}` }),
  'put /api/drafts/:form/:subject': ({ patientId }) => ({
    path: `/api/drafts/spirometry/${patientId}`,
    body: { content: { fev1: '1.3' } },
  }),
  'delete /api/drafts/:form/:subject': ({ patientId }) => ({ path: `/api/drafts/spirometry/${patientId}` }),
  'get /api/me/home': () => ({ path: '/api/me/home' }),
};
