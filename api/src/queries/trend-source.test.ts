import { afterAll, beforeAll, expect, it } from 'vitest';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { addMeasurement, addPatient } from '../testing/factories/scene';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let clinic: TestClinic;

beforeAll(async () => {
  server = await startTestServer();
  clinic = await makeClinic(server, 'America/Denver');
});
afterAll(() => server.close());

it('takes of several results of one instant the one recorded last (rule TR-1 c)', async () => {
  const patientId = await addPatient(clinic);
  const values = [22, 15, 19, 11, 24, 13, 20, 17];
  for (const value of values) {
    await addMeasurement(clinic, patientId, { measure: 'cat', takenAt: '2026-06-10T15:30:00Z', value });
    server.clock.advance(1000);
  }
  const { body } = await clinic.as.therapist.get(`/api/patients/${patientId}/trends?measures=cat`).expect(200);
  const points = body.series[0].points as { value: number; compared: boolean }[];
  expect(points.map((point) => point.value)).toEqual(values);
  expect(points.map((point) => point.compared)).toEqual(values.map((_value, index) => index === values.length - 1));
});
