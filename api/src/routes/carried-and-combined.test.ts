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

const volume = (measure: string, value: number, takenAt: string) => ({
  measure,
  value,
  takenAt,
  conditions: { method: 'plethysmography' },
});

async function pointsOf(patientId: string, measure: string) {
  const response = await own.as.therapist.get(`/api/patients/${patientId}/trends?measures=${measure}`).expect(200);
  return response.body.series[0].points as {
    percentPredicted: number | null;
    value: number;
    heightCm: number | null;
  }[];
}

describe('a height carried to a result', () => {
  it('may come later on the same clinic day, and from the same day a year before', async () => {
    const patientId = await addPatient(own);
    await addMeasurement(own, patientId, volume('tlc', 6.5, '2026-06-10T16:00:00Z'));
    expect((await pointsOf(patientId, 'tlc'))[0]!.percentPredicted).toBeNull();
    await addBodySize(own, patientId, { takenAt: '2026-06-10T16:30:00Z', heightCm: 174.5 });
    expect((await pointsOf(patientId, 'tlc'))[0]!.heightCm).toBe(174.5);

    const other = await addPatient(own);
    await addBodySize(own, other, { takenAt: '2025-06-10T10:00:00Z', heightCm: 170 });
    await addMeasurement(own, other, volume('tlc', 6.5, '2026-06-10T15:00:00Z'));
    expect((await pointsOf(other, 'tlc'))[0]!.heightCm).toBe(170);
  });

  it('is not taken from the clinic day after, nor from more than 12 months before', async () => {
    const patientId = await addPatient(own);
    await addBodySize(own, patientId, { takenAt: '2025-06-09T15:00:00Z', heightCm: 170 });
    // 05:30 UTC is still the evening before in Denver
    await addBodySize(own, patientId, { takenAt: '2026-06-11T06:30:00Z', heightCm: 171 });
    await addMeasurement(own, patientId, volume('tlc', 6.5, '2026-06-11T05:30:00Z'));
    expect((await pointsOf(patientId, 'tlc'))[0]!.heightCm).toBeNull();
  });
});

describe('RV/TLC', () => {
  it('follows from results of one clinic day, takes a late height along and goes with its input', async () => {
    const patientId = await addPatient(own);
    await addMeasurement(own, patientId, volume('tlc', 6, '2026-06-10T16:00:00Z'));
    const rv = await addMeasurement(own, patientId, volume('rv', 2.4, '2026-06-10T16:05:00Z'));
    const [combined] = await pointsOf(patientId, 'rvtlc');
    expect(combined).toMatchObject({ value: 40, percentPredicted: null });
    await addBodySize(own, patientId, { takenAt: '2026-06-10T17:00:00Z', heightCm: 174.5 });
    expect((await pointsOf(patientId, 'rvtlc'))[0]!.percentPredicted).toBeGreaterThan(50);
    await own.as.therapist.post(`/api/measurements/${rv.id}/void`, { version: 1, reason: 'wrong-test' }).expect(200);
    expect(await pointsOf(patientId, 'rvtlc')).toEqual([]);
  });

  it('does not follow from two methods or two days', async () => {
    const patientId = await addPatient(own);
    await addMeasurement(own, patientId, volume('tlc', 6, '2026-06-10T16:00:00Z'));
    await addMeasurement(own, patientId, volume('rv', 2.4, '2026-06-09T16:00:00Z'));
    await addMeasurement(own, patientId, {
      ...volume('rv', 2.4, '2026-06-10T16:00:00Z'),
      conditions: { method: 'helium' },
    });
    expect(await pointsOf(patientId, 'rvtlc')).toEqual([]);
  });
});

describe('amending', () => {
  it('keeps the conditions it does not name', async () => {
    const patientId = await addPatient(own);
    const body = { ...walkBody(320), conditions: { courseM: 20, oxygenLpm: 2 } };
    const walk = await addMeasurement(own, patientId, body);
    const change = { version: 1, reason: 'aid left out', conditions: { aid: 'cane' } };
    const amended = await own.as.therapist.post(`/api/measurements/${walk.id}/amend`, change).expect(200);
    expect(amended.body.measurement.conditions).toMatchObject({ courseM: 20, oxygenLpm: 2, aid: 'cane' });
  });

  it('refuses a reason without a change', async () => {
    const patientId = await addPatient(own);
    const test = await addSpirometry(own, patientId);
    const answer = await own.as.therapist.post(`/api/spirometry-tests/${test.id}/amend`, {
      version: 1,
      reason: 'none',
    });
    expect(answer.status).toBe(422);
    const detail = await own.as.therapist.get(`/api/spirometry-tests/${test.id}`).expect(200);
    expect(detail.body.history).toEqual([]);
  });
});

describe('a diagnosis entry', () => {
  it('goes before the one made at registration, whatever its date, and confirms its group', async () => {
    const patientId = await addPatient(own, { diagnosisGroup: 'other' });
    const enter = (on: string, details: object) =>
      own.as.pulmonologist
        .post(`/api/patients/${patientId}/file-entries`, { kind: 'diagnosis', on, details })
        .expect(201);
    const record = async () => (await own.as.therapist.get(`/api/patients/${patientId}`).expect(200)).body.patient;
    await enter('2026-05-01', { diagnosisGroup: 'copd', confirmedBy: 'Dr. Test' });
    expect(await record()).toMatchObject({ diagnosisGroup: 'copd', diagnosisConfirmed: true });
    await enter('2020-01-01', { diagnosisGroup: 'asthma' });
    expect(await record()).toMatchObject({ diagnosisGroup: 'copd', diagnosisConfirmed: true });
    await enter('2026-06-01', { diagnosisGroup: 'ild' });
    expect(await record()).toMatchObject({ diagnosisGroup: 'ild', diagnosisConfirmed: false });
  });
});
