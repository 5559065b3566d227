import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { selectRows } from '../db/query';
import { deleteExpiredDrafts } from '../services/save-draft';
import { spirometryBody, walkBody } from '../testing/factories/bodies';
import { makeClinic, makeUser, type TestClinic } from '../testing/factories/clinic';
import { addMeasurement, addPatient, addSpirometry } from '../testing/factories/scene';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;
const standing = '2026-06-15T16:00:00Z';

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server, 'America/Denver');
});
afterEach(() => server.clock.set(standing));
afterAll(() => server.close());

describe('drafts', () => {
  const day = 86_400_000;

  it('come back to their owner alone, the last one kept', async () => {
    const patientId = await addPatient(own);
    const path = `/api/drafts/spirometry/${patientId}`;
    expect((await own.as.therapist.get(path)).body).toEqual({ draft: null });
    await own.as.therapist.put(path, { content: { fev1: '1.3' } }).expect(200);
    await own.as.therapist.put(path, { content: { fev1: '1.32', rows: [1, null, { a: 'b' }] } }).expect(200);
    const found = await own.as.therapist.get(path);
    expect(found.body.draft.content).toEqual({ fev1: '1.32', rows: [1, null, { a: 'b' }] });
    const colleague = await server.signedIn((await makeUser(own.clinic.id, ['therapist'])).id);
    for (const client of [colleague, own.as.coordinator]) {
      expect((await client.get(path)).body).toEqual({ draft: null });
      await client.delete(path).expect(204);
    }
    expect((await own.as.therapist.get(path)).body.draft).not.toBeNull();
    expect((await own.as.therapist.get('/api/drafts/spirometry/new')).body).toEqual({ draft: null });
    await own.as.therapist.delete(path).expect(204);
    expect((await own.as.therapist.get(path)).body).toEqual({ draft: null });
  });

  it('last seven days from the last change, and are then cleared away', async () => {
    const user = await makeUser(own.clinic.id, ['coordinator']);
    const open = async () => await server.signedIn(user.id);
    const path = '/api/drafts/patient/new';
    await (await open()).put(path, { content: { familyName: 'Brask' } }).expect(200);
    server.clock.advance(7 * day - 1);
    const kept = (await (await open()).get(path)).body.draft;
    expect(kept.content).toEqual({ familyName: 'Brask' });
    expect(Date.parse(kept.expiresAt) - Date.parse(kept.savedAt)).toBe(7 * day);
    server.clock.advance(1);
    expect((await (await open()).get(path)).body).toEqual({ draft: null });
    const rows = () => selectRows('select id from drafts where owner_id = $id', { id: user.id });
    expect(await rows()).toHaveLength(1);
    await deleteExpiredDrafts(server.clock.now());
    expect(await rows()).toEqual([]);
  });

  it('refuse forms that do not exist and content that is no object', async () => {
    await own.as.therapist.get('/api/drafts/nothing/new').expect(404);
    for (const body of [{}, { content: 'text' }, { content: [] }, { content: {}, more: 1 }])
      await own.as.therapist.put('/api/drafts/patient/new', body).expect(422);
  });
});

describe('the clinic\u2019s day of an instant', () => {
  // clocks change in Denver on 2026-03-08 (forward) and 2025-11-02 (back), at 2 o'clock
  const days: [string, string, string][] = [
    ['America/Denver', '2026-03-08T06:59:59Z', '2026-03-07'],
    ['America/Denver', '2026-03-08T07:00:00Z', '2026-03-08'],
    ['America/Denver', '2026-03-09T05:59:59Z', '2026-03-08'],
    ['America/Denver', '2026-03-09T06:00:00Z', '2026-03-09'],
    ['America/Denver', '2025-11-02T05:59:59Z', '2025-11-01'],
    ['America/Denver', '2025-11-02T06:00:00Z', '2025-11-02'],
    ['America/Denver', '2025-11-03T06:59:59Z', '2025-11-02'],
    ['America/Denver', '2025-11-03T07:00:00Z', '2025-11-03'],
    ['Pacific/Kiritimati', '2026-06-01T09:59:59Z', '2026-06-01'],
    ['Pacific/Kiritimati', '2026-06-01T10:00:00Z', '2026-06-02'],
    ['Asia/Kathmandu', '2026-06-01T18:15:00Z', '2026-06-02'],
  ];
  const clinics = new Map<string, TestClinic>();

  it.each(days)('in %s, %s is %s', async (zone, instant, date) => {
    const clinic = clinics.get(zone) ?? (await makeClinic(server, zone));
    clinics.set(zone, clinic);
    const patientId = await addPatient(clinic);
    const walk = await addMeasurement(clinic, patientId, walkBody(310, instant));
    const blow = await addSpirometry(clinic, patientId, { performedAt: instant });
    const read = async (path: string) => (await clinic.as.therapist.get(path).expect(200)).body;
    expect((await read(`/api/measurements/${walk.id}`)).measurement.takenOn).toBe(date);
    expect((await read(`/api/spirometry-tests/${blow.id}`)).test.performedOn).toBe(date);
    const listed = (await read(`/api/patients/${patientId}/tests`)).items as { on: string }[];
    expect(listed.map((item) => item.on)).toEqual([date, date]);
    const { series } = await read(`/api/patients/${patientId}/trends?measures=fev1,sixMinuteWalkDistance`);
    for (const { points } of series) expect(points[0]).toMatchObject({ takenOn: date });
    expect((await read(`/api/patients/${patientId}`)).patient.bodySize.heightOn).toBe(date);
  });

  it('decides the age at a test: a birthday begins at the clinic\u2019s midnight', async () => {
    const patientId = await addPatient(own, { birthDate: '1959-03-08' });
    await addSpirometry(own, patientId, { performedAt: '2026-03-08T06:59:59Z' });
    await addSpirometry(own, patientId, { performedAt: '2026-03-08T07:00:00Z' });
    const { body } = await own.as.therapist.get(`/api/patients/${patientId}/trends?measures=fev1`);
    const ages = body.series[0].points.map((point: { ageYears: number }) => Math.floor(point.ageYears)) as number[];
    expect(ages).toEqual([66, 67]);
  });

  it('decides who is 18', async () => {
    const patientId = await addPatient(own, { birthDate: '2008-03-08' });
    const record = (performedAt: string) =>
      own.as.therapist.post(`/api/patients/${patientId}/spirometry-tests`, spirometryBody({ performedAt }));
    expect((await record('2026-03-08T06:59:59Z')).body.errors).toEqual([
      { path: 'performedAt', message: expect.stringMatching(/under 18/) },
    ]);
    expect((await record('2026-03-08T07:00:00Z')).status).toBe(201);
  });

  it('decides today: the age in the header and in the list turns at midnight there', async () => {
    const patientId = await addPatient(own, { birthDate: '1960-06-16', familyName: 'Birthday' });
    const ages = async () => {
      const client = await server.signedIn(own.users.coordinator.id);
      const header = (await client.get(`/api/patients/${patientId}`)).body.patient.ageYears as number;
      const list = (await client.get('/api/patients?search=birthday')).body.items[0].ageYears as number;
      return [header, list];
    };
    server.clock.set('2026-06-16T05:59:59Z');
    expect(await ages()).toEqual([65, 65]);
    server.clock.set('2026-06-16T06:00:00Z');
    expect(await ages()).toEqual([66, 66]);
  });

  it('takes an instant given in any offset as the same instant', async () => {
    const patientId = await addPatient(own);
    const { id } = await addMeasurement(own, patientId, walkBody(310, '2026-06-10T01:30:00+05:45'));
    const { body } = await own.as.therapist.get(`/api/measurements/${id}`);
    expect(body.measurement).toMatchObject({ takenAt: '2026-06-09T19:45:00.000Z', takenOn: '2026-06-09' });
  });
});
