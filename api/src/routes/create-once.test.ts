import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { selectRow } from '../db/query';
import { patientBody, spirometryBody, walkBody } from '../testing/factories/bodies';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { addPatient, fileBody, newId } from '../testing/factories/scene';
import { startTestServer, type Client, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;
let other: TestClinic;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
  other = await makeClinic(server);
});
afterAll(() => server.close());

interface Create {
  client: Client;
  path: string;
  /** The right body under the id, and one that says something else under the same id. */
  body: object;
  changed: object;
  table: string;
  /** Where the made row's id stands in the answer. */
  idOf: (body: never) => string;
  /** Another clinic's client and address for the same kind. */
  foreign: { client: Client; path: string };
}

const staff = async (rest: string, foreignRest = rest) => ({
  client: own.as.therapist,
  path: `/api/patients/${await addPatient(own)}${rest}`,
  foreign: { client: other.as.therapist, path: `/api/patients/${await addPatient(other)}${foreignRest}` },
});
const admin = (path: string) => ({
  client: own.as.administrator,
  path,
  foreign: { client: other.as.administrator, path },
});

type Answer = Record<string, { id: string }>;
const under = (key: string) => (body: never) => (body as Answer)[key]!.id;

const creates: Record<string, (id: string) => Promise<Create>> = {
  patient: async (id) => ({
    client: own.as.coordinator,
    path: '/api/patients',
    foreign: { client: other.as.coordinator, path: '/api/patients' },
    body: patientBody({ id, familyName: 'Once' }),
    changed: patientBody({ id, familyName: 'Twice' }),
    table: 'patients',
    idOf: under('patient'),
  }),
  enrollment: async (id) => {
    const foreign = { client: other.as.coordinator, path: `/api/patients/${await addPatient(other)}/enrollments` };
    return {
      client: own.as.coordinator,
      path: `/api/patients/${await addPatient(own)}/enrollments`,
      foreign,
      body: { id, programId: own.program.id, startOn: '2026-03-02' },
      changed: { id, programId: own.program.id, startOn: '2026-03-03' },
      table: 'enrollments',
      idOf: under('enrollment'),
    };
  },
  'spirometry test': async (id) => ({
    ...(await staff('/spirometry-tests')),
    body: spirometryBody({ id }),
    changed: spirometryBody({ id, best: { fev1: 1.4, fvc: 2.8 } }),
    table: 'spirometry_tests',
    idOf: under('test'),
  }),
  'spirometry pair': async (id) => {
    const before = spirometryBody({ id, bronchodilator: 'before', performedAt: '2026-06-10T14:30:00Z' });
    return {
      ...(await staff('/spirometry-tests')),
      body: { tests: [before, spirometryBody({ id: newId() })] },
      changed: { tests: [before, spirometryBody({ best: { fev1: 1.4, fvc: 2.8 } })] },
      table: 'spirometry_tests',
      idOf: (body: never) => (body as { tests: { id: string }[] }).tests[0]!.id,
    };
  },
  measurement: async (id) => ({
    ...(await staff('/measurements')),
    body: { id, ...walkBody(310) },
    changed: { id, ...walkBody(311) },
    table: 'measurements',
    idOf: under('measurement'),
  }),
  'body size': async (id) => ({
    ...(await staff('/body-sizes')),
    body: { id, takenAt: '2026-06-01T15:00:00Z', heightCm: 174.5, weightKg: 80 },
    changed: { id, takenAt: '2026-06-01T15:00:00Z', heightCm: 174.5, weightKg: 81 },
    table: 'body_sizes',
    idOf: under('bodySize'),
  }),
  'file entry': async (id) => ({
    ...(await staff('/file-entries')),
    body: fileBody('smoking', { status: 'never' }, { id }),
    changed: fileBody('smoking', { status: 'current' }, { id }),
    table: 'file_entries',
    idOf: under('entry'),
  }),
  user: async (id) => ({
    ...admin('/api/users'),
    body: { id, displayName: 'Once', email: `${id}@clinic.test`, roles: ['therapist'] },
    changed: { id, displayName: 'Twice', email: `${id}@clinic.test`, roles: ['therapist'] },
    table: 'users',
    idOf: under('user'),
  }),
  program: async (id) => {
    const numbers = { plannedSessions: 16, weeks: 8, sessionsPerDay: 1, sessionsPerWeek: 2 };
    const body = { id, name: `Once ${id}`, ...numbers, sessionKinds: ['exercise'] };
    return {
      ...admin('/api/programs'),
      body,
      changed: { ...body, weeks: 9 },
      table: 'programs',
      idOf: under('program'),
    };
  },
};

const rowsOf = async (table: string) =>
  (await selectRow<{ count: number }>(`select count(*)::int as count from ${table} where clinic_id = $clinicId`, {
    clinicId: own.clinic.id,
  }))!.count;

/** Rows of every kind one create may write; a second writing of any of them would show. */
const tables = [
  'patients',
  'enrollments',
  'spirometry_tests',
  'measurements',
  'body_sizes',
  'file_entries',
  'users',
  'programs',
];
const counts = async () => await Promise.all(tables.map(rowsOf));

describe.each(Object.keys(creates))('creating a %s under a client-made id', (kind) => {
  it('answers the same request again with the first result, and another one with 409', async () => {
    const id = newId();
    const { client, path, body, changed, table, idOf, foreign } = await creates[kind]!(id);
    const first = await client.post(path, body);
    expect(first.status).toBe(201);
    expect(idOf(first.body as never)).toBe(id);
    const after = await counts();

    const again = await client.post(path, body);
    expect(again.status).toBe(200);
    // a link is shown once only; all else is the first answer
    expect({ ...again.body, invitation: null }).toEqual({ ...first.body, invitation: null });
    const reordered = Object.fromEntries(Object.entries(body).reverse());
    expect((await client.post(path, reordered)).status).toBe(200);

    const different = await client.post(path, changed);
    expect(different.status).toBe(409);
    expect(different.body.type).toBe('/problems/id-taken');
    const fromElsewhere = await foreign.client.post(foreign.path, body);
    expect(fromElsewhere.status).toBe(409);
    expect(fromElsewhere.text).not.toContain(path);
    expect(await counts()).toEqual(after);
    expect(tables).toContain(table);
  });

  it('stores one of five sent at once', async () => {
    const id = newId();
    const { client, path, body, table, idOf } = await creates[kind]!(id);
    const before = await rowsOf(table);
    const answers = await Promise.all(Array.from({ length: 5 }, () => client.post(path, body)));
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 200, 200, 200, 201]);
    expect(new Set(answers.map((answer) => idOf(answer.body as never)))).toEqual(new Set([id]));
    expect(await rowsOf(table)).toBe(before + (kind === 'spirometry pair' ? 2 : 1));
  });
});

describe('record numbers', () => {
  it('are given out one by one, also at once, and a taken one is refused', async () => {
    const made = await Promise.all(
      Array.from({ length: 6 }, () => own.as.coordinator.post('/api/patients', patientBody())),
    );
    const numbers = made.map((answer) => answer.body.patient.recordNumber as string);
    expect(new Set(numbers).size).toBe(6);
    const taken = await own.as.coordinator.post('/api/patients', patientBody({ recordNumber: numbers[0] }));
    expect(taken.status).toBe(409);
    expect(taken.body.errors[0].path).toBe('recordNumber');
    await other.as.coordinator.post('/api/patients', patientBody({ recordNumber: `only-${numbers[0]}` })).expect(201);
  });
});
