import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { addPatient, addSpirometry } from '../testing/factories/scene';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
});
afterAll(() => server.close());

describe('correcting a birth date', () => {
  it('is refused when a test would come before the 18th birthday, and moves ages and predictions otherwise', async () => {
    const id = await addPatient(own, { birthDate: '1959-03-02' });
    await addSpirometry(own, id, { performedAt: '2026-06-10T15:00:00Z' });
    const trend = async () => (await own.as.therapist.get(`/api/patients/${id}/trends?measures=fev1`)).body.series[0];
    const before = await trend();
    const refused = await own.as.coordinator.patch(`/api/patients/${id}`, { version: 1, birthDate: '2008-06-12' });
    expect(refused.status).toBe(422);
    expect(refused.body.errors[0].path).toBe('birthDate');
    await own.as.coordinator.patch(`/api/patients/${id}`, { version: 1, birthDate: '1969-03-02' }).expect(200);
    const after = await trend();
    expect(after.points[0].ageYears).toBeCloseTo(before.points[0].ageYears - 10, 1);
    expect(after.points[0].predicted).toBeGreaterThan(before.points[0].predicted);
  });
});
