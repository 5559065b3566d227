import { roles } from '@slighthill/shared/permissions';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Patient } from '../models/patient';
import { accessExpectations, fileEntryExpectations } from '../testing/access-expectations';
import { accessTargets, type Stage, type Target } from '../testing/access-targets';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { addFileEntry, addPatient, fileBody, orderDetails } from '../testing/factories/scene';
import { Client, startTestServer, type TestServer } from '../testing/server';
import { allRoutes } from './all-routes';

let server: TestServer;
let own: TestClinic;
let other: TestClinic;
let ownRecord: string;
let anotherRecord: string;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
  other = await makeClinic(server);
  ownRecord = own.users.patient.patientId!;
  anotherRecord = await addPatient(own);
});
afterAll(() => server.close());

const routes = allRoutes({ sessions: {} as never, clock: { now: () => new Date() } });
const keyOf = (route: { method: string; path: string }) => `${route.method} ${route.path}`;

/** One row of callers in the order of the table; signing out uses up a session, so each call may need a fresh one. */
async function callers(clinic: TestClinic, key: string): Promise<Client[]> {
  if (key !== 'post /api/auth/sign-out') return [...roles.map((role) => clinic.as[role]), new Client(server.base)];
  const fresh = await Promise.all(roles.map((role) => server.signedIn(clinic.users[role].id)));
  return [...fresh, new Client(server.base)];
}

/** Calls with each caller in turn; the target is made anew once a call has changed it. */
async function statusesOf(key: string, stage: Stage, from: TestClinic): Promise<{ statuses: number[]; text: string }> {
  const method = key.split(' ')[0]!;
  const prepare = accessTargets[key];
  if (!prepare) throw new Error(`${key} has no request to try it with`);
  let target: Target | null = null;
  let text = '';
  const statuses: number[] = [];
  for (const client of await callers(from, key)) {
    target ??= await prepare(stage);
    const response = await client.send(method, target.path, target.body);
    statuses.push(response.status);
    text += response.text;
    if (method !== 'get' && response.status < 300) target = null;
  }
  return { statuses, text };
}

describe('access', () => {
  it('lists every route once, and nothing that is no route', () => {
    const keys = routes.map(keyOf);
    expect(new Set(keys).size).toBe(keys.length);
    expect(Object.keys(accessExpectations).sort()).toEqual([...keys].sort());
    expect(Object.keys(accessTargets).sort()).toEqual([...keys].sort());
  });

  it.each(routes.map(keyOf))('%s answers each role as the matrix says', async (key) => {
    const expected = accessExpectations[key]!;
    const patientId = await addPatient(own);
    const mine = await statusesOf(key, { server, clinic: own, patientId }, own);
    expect(mine.statuses).toEqual(expected.own);
    if (key.includes(':')) {
      const { path, body } = await accessTargets[key]!({ server, clinic: own, patientId: ownRecord });
      const asked = await own.as.patient.send(key.split(' ')[0]!, path, body);
      expect(asked.status).toBe(expected.own[4]);
    }
    const foreign = await statusesOf(key, { server, clinic: own, patientId }, other);
    expect(foreign.statuses).toEqual(expected.other);
    if (key.includes('/auth/')) return;
    for (const secret of [own.clinic.id, own.program.id, own.users.therapist.id, patientId, anotherRecord])
      expect(foreign.text).not.toContain(secret);
  });

  it('keeps a patient out of the records, the own one included, whatever the id', async () => {
    for (const id of [ownRecord, anotherRecord, other.users.patient.patientId!, 'not-an-id'])
      for (const rest of ['', '/tests', '/trends', '/file-entries'])
        await own.as.patient.get(`/api/patients/${id}${rest}`).expect(403);
  });

  it('shows a patient nothing but the own page', async () => {
    const home = await own.as.patient.get('/api/me/home');
    expect(home.body.givenName).toBe('Own');
    const record = await Patient.findByPk(ownRecord);
    expect(home.text).not.toContain(record!.familyName);
  });

  it('answers 404 for an id that exists nowhere and for one that is no id', async () => {
    for (const id of ['4f6f1c0e-0000-4000-8000-000000000000', 'not-an-id', '1'])
      await own.as.therapist.get(`/api/patients/${id}`).expect(404);
    await own.as.therapist.get('/api/nowhere').expect(404);
  });
});

describe('entries of the file that not everyone may change', () => {
  const order = (outside: boolean) => fileBody('oxygen-order', orderDetails(outside));
  const hold = fileBody('safety-hold', { item: 'faint' });
  const amend = async (entry: object, changes: object) => {
    const { id } = await addFileEntry(own, anotherRecord, entry);
    return { path: `/api/file-entries/${id}/amend`, body: { version: 1, reason: 'Corrected', ...changes } };
  };
  const voidOf = async (entry: object) => {
    const { id } = await addFileEntry(own, anotherRecord, entry);
    return { path: `/api/file-entries/${id}/void`, body: { version: 1, reason: 'duplicate' } };
  };
  const enter = async (body: object) => ({ path: `/api/patients/${anotherRecord}/file-entries`, body });
  const attempts: Record<string, () => Promise<Required<Target>>> = {
    'enter an oxygen order of this clinic': () => enter(order(false)),
    'record what an outside oxygen order says': () => enter(order(true)),
    'amend an oxygen order of this clinic': () => amend(order(false), { note: 'As before' }),
    'turn an order of this clinic into an outside one': () => amend(order(false), { details: orderDetails(true) }),
    'turn an outside order into one of this clinic': () => amend(order(true), { details: orderDetails(false) }),
    'void an oxygen order of this clinic': () => voidOf(order(false)),
    'amend an outside oxygen order': () => amend(order(true), { note: 'As written' }),
    'raise a safety hold': () => enter(hold),
    'amend a safety hold': () => amend(hold, { note: 'Seen again' }),
    'void a safety hold': () => voidOf(hold),
  };

  it.each(Object.entries(fileEntryExpectations))('%s', async (name, expected) => {
    const statuses: number[] = [];
    for (const role of ['coordinator', 'therapist', 'pulmonologist'] as const) {
      const { path, body } = await attempts[name]!();
      statuses.push((await own.as[role].post(path, body)).status);
    }
    expect(statuses).toEqual([...expected]);
  });
});
