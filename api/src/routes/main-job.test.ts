import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { patientBody, spirometryBody, walkBody } from '../testing/factories/bodies';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
});
afterAll(() => server.close());

async function newPatient(changes: object = {}): Promise<string> {
  const response = await own.as.coordinator.post('/api/patients', patientBody(changes));
  expect(response.body).toMatchObject({ patient: { version: 1 } });
  expect(response.status).toBe(201);
  return response.body.patient.id as string;
}

describe('the main job', () => {
  it('goes from enrolling to a graded trend', async () => {
    const id = await newPatient();
    const enrolled = await own.as.coordinator.post(`/api/patients/${id}/enrollments`, {
      programId: own.program.id,
      startOn: '2026-03-02',
    });
    expect(enrolled.status).toBe(201);
    const therapist = own.as.therapist;
    const pair = await therapist.post(`/api/patients/${id}/spirometry-tests`, {
      tests: [
        spirometryBody({
          performedAt: '2026-02-24T15:00:00Z',
          bronchodilator: 'before',
          best: { fev1: 1.22, fvc: 2.6 },
        }),
        spirometryBody({
          performedAt: '2026-02-24T15:30:00Z',
          best: null,
          maneuvers: [
            { fev1: 1.32, fvc: 2.7, pef: 3.9 },
            { fev1: 1.3, fvc: 2.78 },
            { fev1: 1.5, fvc: 2.75, fev1Accepted: false, reason: 'cough in first second' },
          ],
        }),
      ],
    });
    expect(pair.body.errors).toBeUndefined();
    expect(pair.status).toBe(201);
    expect(pair.body.tests[0].visitId).toBe(pair.body.tests[1].visitId);
    expect(pair.body.tests[1].best).toMatchObject({ fev1: 1.32, fvc: 2.78 });
    await therapist
      .post(`/api/patients/${id}/spirometry-tests`, spirometryBody({ best: { fev1: 1.38, fvc: 2.85 } }))
      .expect(201);
    await therapist.post(`/api/patients/${id}/measurements`, walkBody(310, '2026-02-24T16:00:00Z')).expect(201);
    await therapist.post(`/api/patients/${id}/measurements`, walkBody(352)).expect(201);
    const cat = { measure: 'cat', takenAt: '2026-02-24T16:00:00Z', value: 22 };
    await therapist.post(`/api/patients/${id}/measurements`, cat).expect(201);

    const tlc = {
      measure: 'tlc',
      takenAt: '2026-06-01T16:00:00Z',
      value: 7.6,
      conditions: { method: 'plethysmography' },
    };
    const recordedTlc = await therapist.post(`/api/patients/${id}/measurements`, tlc).expect(201);
    expect(recordedTlc.body.measurement).toMatchObject({ heightCm: 174.5, heightCarried: true });

    const trends = await own.as.pulmonologist.get(
      `/api/patients/${id}/trends?measures=fev1,fvc,fev1fvc,sixMinuteWalkDistance,cat`,
    );
    expect(trends.status).toBe(200);
    expect(trends.body.pattern).toMatchObject({ id: 'obstruction', lowByFixedRatio: true, provisional: false });
    const [fev1] = trends.body.series;
    expect(fev1.points).toHaveLength(3);
    expect(
      fev1.points.every((point: { state: string; compared: boolean }) => point.compared === (point.state === 'after')),
    ).toBe(true);
    expect(fev1.change).toMatchObject({ absolute: 0.06, verdict: 'within-variation' });
    const walk = trends.body.series.find((series: { measure: string }) => series.measure === 'sixMinuteWalkDistance');
    expect(walk.change).toMatchObject({ absolute: 42, verdict: 'better' });

    const record = await own.as.coordinator.get(`/api/patients/${id}`);
    expect(record.body.patient).toMatchObject({
      pattern: { id: 'obstruction' },
      enrollment: { status: 'planned' },
      bodySize: { heightCm: 174.5 },
      counts: { tests: 7 },
    });
    const tests = await own.as.coordinator.get(`/api/patients/${id}/tests`);
    expect(tests.body.items).toHaveLength(7);
  });
});
