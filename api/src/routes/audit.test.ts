import { Writable } from 'node:stream';
import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { selectRow, selectRows } from '../db/query';
import { patientBody, spirometryBody, walkBody } from '../testing/factories/bodies';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import {
  addEnrollment,
  addFileEntry,
  addFlag,
  addMeasurement,
  addPatient,
  addSpirometry,
  fileBody,
} from '../testing/factories/scene';
import { startTestServer, type Client, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;
const logged: string[] = [];

beforeAll(async () => {
  const memory = new Writable({
    write(chunk: Buffer, _encoding, done) {
      logged.push(chunk.toString());
      done();
    },
  });
  server = await startTestServer({ logger: pino({ level: 'trace' }, memory) });
  own = await makeClinic(server);
});
afterAll(() => server.close());

interface Event {
  id: string;
  action: string;
  outcome: string;
  actorId: string;
  patientIds: string[];
  at: Date;
}

async function eventsOf(work: () => Promise<unknown>): Promise<Event[]> {
  const last = await selectRow<{ id: string }>('select coalesce(max(id), 0)::text as id from audit_events');
  await work();
  return await selectRows<Event>(
    `select id::text, action, outcome, actor_id as "actorId", patient_ids as "patientIds", at from audit_events
     where clinic_id = $clinicId and id > $last::bigint order by audit_events.id`,
    { clinicId: own.clinic.id, last: last!.id },
  );
}

type Send = (client: Client) => PromiseLike<{ status: number; body: unknown }>;

describe('the trail', () => {
  it('keeps one event a request, naming exactly the patients shown', async () => {
    const [a, b] = [await addPatient(own, { familyName: 'Zweig' }), await addPatient(own, { familyName: 'Zweigle' })];
    const enrollment = await addEnrollment(own, a);
    const test = await addSpirometry(own, a);
    const walk = await addMeasurement(own, a);
    const smoking = await addFileEntry(own, a);
    const flag = await addFlag(own, a);
    const change = { version: 1, reason: 'Typed wrong', note: 'x' };
    const requests: [string, string[], keyof TestClinic['as'], Send][] = [
      ['patient.list', [a, b], 'coordinator', (c) => c.get('/api/patients?search=zweig')],
      ['patient.list', [b], 'coordinator', (c) => c.get('/api/patients?search=zweigle')],
      [
        'patient.duplicate-check',
        [a],
        'coordinator',
        (c) =>
          c.post('/api/patients/duplicate-check', {
            givenName: 'Leland',
            familyName: 'zweig',
            birthDate: '1959-03-02',
          }),
      ],
      ['patient.read', [a], 'pulmonologist', (c) => c.get(`/api/patients/${a}`)],
      ['patient.change', [a], 'coordinator', (c) => c.patch(`/api/patients/${a}`, { version: 1, phone: '555' })],
      ['enrollment.list', [a], 'therapist', (c) => c.get(`/api/patients/${a}/enrollments`)],
      [
        'enrollment.change',
        [a],
        'coordinator',
        (c) => c.patch(`/api/enrollments/${enrollment.id}`, { version: 1, consentOn: '2026-03-01' }),
      ],
      ['test.list', [a], 'therapist', (c) => c.get(`/api/patients/${a}/tests`)],
      ['trend.read', [a], 'pulmonologist', (c) => c.get(`/api/patients/${a}/trends`)],
      [
        'spirometry-test.create',
        [b],
        'therapist',
        (c) => c.post(`/api/patients/${b}/spirometry-tests`, spirometryBody()),
      ],
      ['spirometry-test.read', [a], 'therapist', (c) => c.get(`/api/spirometry-tests/${test.id}`)],
      ['spirometry-test.amend', [a], 'therapist', (c) => c.post(`/api/spirometry-tests/${test.id}/amend`, change)],
      ['measurement.create', [b], 'therapist', (c) => c.post(`/api/patients/${b}/measurements`, walkBody(300))],
      [
        'measurement.void',
        [a],
        'therapist',
        (c) => c.post(`/api/measurements/${walk.id}/void`, { version: 1, reason: 'duplicate' }),
      ],
      [
        'file-entry.create',
        [b],
        'therapist',
        (c) => c.post(`/api/patients/${b}/file-entries`, fileBody('smoking', { status: 'never' })),
      ],
      ['file-entry.read', [a], 'therapist', (c) => c.get(`/api/file-entries/${smoking.id}`)],
      [
        'flag.resolve',
        [a],
        'therapist',
        (c) => c.post(`/api/flags/${flag.id}/resolve`, { version: flag.version, note: 'ok' }),
      ],
      ['me.home', [own.users.patient.patientId!], 'patient', (c) => c.get('/api/me/home')],
    ];
    for (const [action, patients, role, send] of requests) {
      const events = await eventsOf(async () => {
        const answer = await send(own.as[role]);
        expect([action, answer.status]).toEqual([action, answer.status === 201 ? 201 : 200]);
      });
      expect(events.map((event) => event.action)).toEqual([action]);
      expect(events[0]).toMatchObject({ outcome: 'done', actorId: own.users[role].id, at: server.clock.now() });
      expect([...events[0]!.patientIds].sort()).toEqual([...patients].sort());
    }
  });

  it('names a new patient in the event that made it', async () => {
    let id = '';
    const events = await eventsOf(async () => {
      id = (await own.as.coordinator.post('/api/patients', patientBody())).body.patient.id as string;
    });
    expect(events).toHaveLength(1);
    expect(events[0]).toMatchObject({ action: 'patient.create', patientIds: [id] });
  });

  it('keeps no search words, only what was found', async () => {
    await addPatient(own, { givenName: 'Quillon', familyName: 'Oddname' });
    const events = await eventsOf(() => own.as.coordinator.get('/api/patients?search=Oddna').expect(200));
    expect(events[0]!.patientIds).toHaveLength(1);
    await own.as.coordinator.get('/api/patients?search=nobodyhasthis').expect(200);
    const rows = await selectRows<{ row: object }>(
      'select to_jsonb(e) as row from audit_events e where clinic_id = $clinicId',
      { clinicId: own.clinic.id },
    );
    expect(rows.length).toBeGreaterThan(0);
    expect(JSON.stringify(rows)).not.toMatch(/oddna|quillon|nobodyhasthis|search/i);
  });

  it('records what a role was refused, and nothing for what does not exist', async () => {
    const patientId = await addPatient(own);
    const refused = await eventsOf(() => own.as.administrator.get(`/api/patients/${patientId}`).expect(403));
    expect(refused).toHaveLength(1);
    expect(refused[0]).toMatchObject({
      action: 'patient.read',
      outcome: 'refused',
      actorId: own.users.administrator.id,
      patientIds: [],
    });
    const other = await makeClinic(server);
    expect(await eventsOf(() => other.as.therapist.get(`/api/patients/${patientId}`).expect(404))).toEqual([]);
  });

  it('is part of the command: a refused write leaves none', async () => {
    const patientId = await addPatient(own);
    const { id } = await addMeasurement(own, patientId);
    const events = await eventsOf(() =>
      own.as.therapist.post(`/api/measurements/${id}/amend`, { version: 1, reason: 'x', value: -1 }).expect(422),
    );
    expect(events).toEqual([]);
  });

  it('is read by the administrator with names and numbers, by patient and by day, and by nobody else', async () => {
    const patientId = await addPatient(own, { givenName: 'Odile', familyName: 'Traced' });
    await own.as.pulmonologist.get(`/api/patients/${patientId}`).expect(200);
    const read = async (query: string) =>
      (await own.as.administrator.get(`/api/audit-events?${query}`).expect(200)).body;
    const { items } = await read(`patient=${patientId}`);
    expect(items.map((item: { action: string }) => item.action)).toEqual(['patient.read', 'patient.create']);
    expect(items[0]).toMatchObject({ actorName: 'Test pulmonologist', patientCount: 1 });
    expect(items[0].patients).toEqual([{ id: patientId, name: 'Odile Traced', recordNumber: expect.any(String) }]);
    const mine = await read(`patient=${patientId}&actor=${own.users.pulmonologist.id}`);
    expect(mine.items).toHaveLength(1);
    // the two readings above are in the trail themselves, since they named the patient
    const ofTheDay = await read(`patient=${patientId}&from=2026-06-15&to=2026-06-15`);
    expect(ofTheDay.items.map((item: { action: string }) => item.action)).toEqual([
      'audit.read',
      'audit.read',
      'patient.read',
      'patient.create',
    ]);
    expect((await read(`patient=${patientId}&from=2026-06-16`)).items).toEqual([]);
    expect((await read(`patient=${patientId}&to=2026-06-14`)).items).toEqual([]);
  });
});

describe('the server\u2019s log', () => {
  it('holds one line a request with the route\u2019s pattern, and no query strings, names, ids, bodies or cookies', async () => {
    const patientId = await addPatient(own, {
      givenName: 'Quillon',
      familyName: 'Loggedname',
      email: 'quillon@patient.test',
    });
    logged.length = 0;
    const { therapist, coordinator } = own.as;
    await coordinator.get('/api/patients?search=Loggedname').expect(200);
    await therapist.get(`/api/patients/${patientId}/trends?measures=fev1`).expect(200);
    await therapist
      .post(`/api/patients/${patientId}/measurements`, { ...walkBody(-1), note: 'Loggedname' })
      .expect(422);
    await therapist.get(`/api/patients/${patientId}/Loggedname?x=Loggedname`).expect(404);
    await server.anonymous
      .post('/api/auth/sign-in', { email: 'quillon@patient.test', password: 'Loggedname' })
      .expect(401);
    await expect.poll(() => logged.length).toBe(5);
    const text = logged.join('');
    for (const secret of [
      'Loggedname',
      'loggedname',
      'quillon',
      'search',
      'measures=',
      patientId,
      own.clinic.id,
      therapist.cookie!.split('=')[1]!,
    ])
      expect(text).not.toContain(secret);
    const lines = logged.map((line) => JSON.parse(line) as { route: string; status: number; method: string });
    expect(lines.map(({ method, route, status }) => `${method} ${route} ${status}`)).toEqual([
      'GET /api/patients 200',
      'GET /api/patients/:id/trends 200',
      'POST /api/patients/:id/measurements 422',
      'GET unmatched 404',
      'POST /api/auth/sign-in 401',
    ]);
  });
});
