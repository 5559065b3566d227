import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { addBodySize, addMeasurement, addPatient, addSpirometry } from '../testing/factories/scene';
import { walkBody } from '../testing/factories/bodies';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
});
afterAll(() => server.close());

describe('two people on one record', () => {
  it('wait for each other: recording, amending and voiding side by side never fails on the server', async () => {
    const { therapist, coordinator, pulmonologist } = own.as;
    for (let round = 0; round < 6; round += 1) {
      const patientId = await addPatient(own);
      const walk = await addMeasurement(own, patientId, walkBody(300));
      const test = await addSpirometry(own, patientId);
      const size = await addBodySize(own, patientId, { takenAt: '2026-06-01T15:00:00Z', heightCm: 174.5 });
      const reason = { version: 1, reason: 'typing error' };
      const answers = await Promise.all([
        therapist.post(`/api/measurements/${walk.id}/amend`, { ...reason, value: 310 }),
        coordinator.post(`/api/patients/${patientId}/body-sizes`, { takenAt: '2026-06-02T15:00:00Z', heightCm: 175 }),
        pulmonologist.post(`/api/spirometry-tests/${test.id}/amend`, { ...reason, heightCm: 174 }),
        therapist.post(`/api/body-sizes/${size.id}/void`, { version: 1, reason: 'duplicate' }),
        coordinator.post(`/api/patients/${patientId}/measurements`, walkBody(305, '2026-06-11T15:00:00Z')),
        coordinator.patch(`/api/patients/${patientId}`, { version: 1, phone: '555-0100' }),
      ]);
      expect(answers.map((answer) => answer.status)).toEqual([200, 201, 200, 200, 201, 200]);
    }
  });
});
