import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { selectRow } from '../db/query';
import { spirometryBody } from '../testing/factories/bodies';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import {
  addBodySize,
  addEnrollment,
  addFileEntry,
  addMeasurement,
  addPatient,
  addSpirometry,
  fileBody,
  phq9Body,
  type Entry,
} from '../testing/factories/scene';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;
let patientId: string;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
});
afterAll(() => server.close());

const therapist = () => own.as.therapist;
const post = async (path: string, body: object) => await therapist().post(path, body);
const read = async (path: string) => (await therapist().get(path).expect(200)).body;

interface Series {
  measure: string;
  points: { value: number; sourceId: string; heightCm: number | null; heightCarried: boolean; takenOn: string }[];
}

async function points(measure: string): Promise<Series['points']> {
  const { series } = (await read(`/api/patients/${patientId}/trends?measures=${measure}`)) as { series: Series[] };
  return series.find((one) => one.measure === measure)?.points ?? [];
}
const values = async (measure: string) => (await points(measure)).map((point) => point.value);

describe('amending', () => {
  const kinds: [string, (id: string) => Promise<Entry>, object, string, (body: never) => unknown][] = [
    [
      'spirometry-tests',
      (id) => addSpirometry(own, id),
      { best: { fev1: 1.41, fvc: 2.78 } },
      'test',
      (entry: never) => (entry as { best: { fev1: number } }).best.fev1,
    ],
    [
      'measurements',
      (id) => addMeasurement(own, id),
      { value: 333 },
      'measurement',
      (entry: { value: number }) => entry.value,
    ],
    [
      'body-sizes',
      (id) => addBodySize(own, id),
      { weightKg: 82.5 },
      'bodySize',
      (entry: { weightKg: number }) => entry.weightKg,
    ],
    [
      'file-entries',
      (id) => addFileEntry(own, id),
      { details: { status: 'current' } },
      'entry',
      (entry: { details: { status: string } }) => entry.details.status,
    ],
  ];

  it.each(kinds)('of %s keeps the earlier value with who, when and why', async (kind, add, changes, key, valueOf) => {
    patientId = await addPatient(own);
    const { id } = await add(patientId);
    const before = (await read(`/api/${kind}/${id}`))[key];
    const amended = await own.as.coordinator.post(`/api/${kind}/${id}/amend`, {
      version: 1,
      reason: 'Read wrong',
      ...changes,
    });
    expect(amended.status).toBe(200);
    expect(amended.body[key].version).toBe(2);
    expect(valueOf(amended.body[key] as never)).not.toEqual(valueOf(before as never));
    expect(amended.body.history).toEqual([
      {
        version: 1,
        changedAt: server.clock.now().toISOString(),
        changedBy: { id: own.users.coordinator.id, displayName: own.users.coordinator.displayName },
        reason: 'Read wrong',
        before,
      },
    ]);
    expect(amended.body[key].recordedBy).toEqual(before.recordedBy);
    const second = await post(`/api/${kind}/${id}/amend`, { version: 2, reason: 'And again', note: 'Seen twice' });
    expect(second.body.history.map((one: { version: number }) => one.version)).toEqual([2, 1]);
    await post(`/api/${kind}/${id}/amend`, { version: 1, reason: 'Late', ...changes }).then((late) =>
      expect(late.status).toBe(409),
    );
  });

  it('lets one of two changes at once win', async () => {
    patientId = await addPatient(own);
    const { id } = await addMeasurement(own, patientId);
    const change = (value: number) =>
      post(`/api/measurements/${id}/amend`, { version: 1, reason: 'Typed wrong', value });
    const answers = await Promise.all([change(320), change(330), change(340)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409, 409]);
    const winner = answers.find((answer) => answer.status === 200)!;
    expect(await values('sixMinuteWalkDistance')).toEqual([winner.body.measurement.value]);
  });

  it('shows the amended values, the new day and the derived ratio in trends', async () => {
    patientId = await addPatient(own);
    const { id } = await addSpirometry(own, patientId, { weightKg: 80 });
    await post(`/api/spirometry-tests/${id}/amend`, {
      version: 1,
      reason: 'Other sheet',
      performedAt: '2026-06-09T15:00:00Z',
      weightKg: 90,
      maneuvers: [
        { fev1: 1.5, fvc: 3, pef: 4 },
        { fev1: 1.45, fvc: 3.1 },
      ],
    });
    expect(await values('fev1')).toEqual([1.5]);
    expect(await values('fvc')).toEqual([3.1]);
    expect((await points('fev1'))[0]!.takenOn).toBe('2026-06-09');
    expect((await values('fev1fvc'))[0]).toBeCloseTo(1.5 / 3.1, 6);
    expect(await values('weight')).toEqual([90]);
    // a measure the test no longer gives leaves the trend
    await post(`/api/spirometry-tests/${id}/amend`, { version: 2, reason: 'No scale', weightKg: null });
    expect(await values('weight')).toEqual([]);
    expect(await values('bmi')).toEqual([]);
  });
});

describe('voiding', () => {
  it('takes a test out of pattern, trend, flags and the enrollment\u2019s summary in the same request', async () => {
    patientId = await addPatient(own);
    const enrollment = await addEnrollment(own, patientId);
    const summary = async () =>
      await selectRow<{ pattern: { id: string } | null; last: string | null }>(
        `select pattern, last_test_on::text as last from enrollment_summaries where enrollment_id = $id`,
        { id: enrollment.id },
      );
    const normal = spirometryBody({ performedAt: '2026-06-01T15:00:00Z', best: { fev1: 3.4, fvc: 4.3 } });
    await addSpirometry(own, patientId, normal);
    expect((await summary())!.pattern!.id).toBe('normal');
    const { id } = await addSpirometry(own, patientId);
    expect((await read(`/api/patients/${patientId}`)).patient.pattern.id).toBe('obstruction-possible-mixed');
    expect(await summary()).toMatchObject({ pattern: { id: 'obstruction-possible-mixed' }, last: '2026-06-10' });

    const voided = await post(`/api/spirometry-tests/${id}/void`, { version: 1, reason: 'wrong-patient' });
    expect(voided.status).toBe(200);
    expect((await read(`/api/patients/${patientId}`)).patient.pattern.id).toBe('normal');
    expect(await summary()).toMatchObject({ pattern: { id: 'normal' }, last: '2026-06-01' });
    expect(await values('fev1')).toEqual([3.4]);

    const phq9 = await addMeasurement(own, patientId, phq9Body(2));
    expect((await read(`/api/patients/${patientId}`)).patient.openFlags).toHaveLength(1);
    await post(`/api/measurements/${phq9.id}/void`, { version: 1, reason: 'wrong-patient' });
    expect((await read(`/api/patients/${patientId}`)).patient.openFlags).toEqual([]);
  });

  it('leaves the entry readable with who, when and why, and closed to change', async () => {
    patientId = await addPatient(own);
    const made: [string, string, Entry][] = [
      ['spirometry-tests', 'test', await addSpirometry(own, patientId)],
      ['measurements', 'measurement', await addMeasurement(own, patientId)],
      ['body-sizes', 'bodySize', await addBodySize(own, patientId)],
      ['file-entries', 'entry', await addFileEntry(own, patientId)],
    ];
    for (const [kind, key, { id }] of made) {
      const wordless = await post(`/api/${kind}/${id}/void`, { version: 1, reason: 'other' });
      expect(wordless.body.errors).toEqual([{ path: 'text', message: 'Say why in a few words' }]);
      await post(`/api/${kind}/${id}/void`, { version: 1, reason: 'other', text: 'Mouthpiece leaked' });
      const body = await read(`/api/${kind}/${id}`);
      expect(body[key].voided).toEqual({
        at: server.clock.now().toISOString(),
        by: { id: own.users.therapist.id, displayName: own.users.therapist.displayName },
        reason: 'other',
        text: 'Mouthpiece leaked',
      });
      expect(body.abilities).toEqual([]);
      for (const [action, rest] of [
        ['amend', { note: 'x' }],
        ['void', {}],
      ] as const) {
        const again = await post(`/api/${kind}/${id}/${action}`, { version: 2, reason: 'duplicate', ...rest });
        expect([kind, action, again.status, again.body.type]).toEqual([kind, action, 409, '/problems/wrong-state']);
      }
    }
    const listed = (await read(`/api/patients/${patientId}/tests`)).items as { id: string; voided: boolean }[];
    expect(listed).toHaveLength(3);
    expect(listed.every((item) => item.voided)).toBe(true);
    expect((await read(`/api/patients/${patientId}`)).patient.counts.tests).toBe(0);
  });

  it('of a height brings carried heights and BMI in line', async () => {
    patientId = await addPatient(own);
    await addBodySize(own, patientId, { takenAt: '2026-01-10T15:00:00Z', heightCm: 180, weightKg: null });
    const { id } = await addBodySize(own, patientId, {
      takenAt: '2026-02-10T15:00:00Z',
      heightCm: 174,
      weightKg: null,
    });
    await addBodySize(own, patientId, { takenAt: '2026-03-10T15:00:00Z', heightCm: null, weightKg: 81 });
    await addMeasurement(own, patientId);
    const walkHeight = async () => (await points('sixMinuteWalkDistance'))[0];
    expect(await walkHeight()).toMatchObject({ heightCm: 174, heightCarried: true });
    expect((await values('bmi'))[0]).toBeCloseTo(81 / 1.74 ** 2, 1);
    await post(`/api/body-sizes/${id}/amend`, { version: 1, reason: 'Stood on toes', heightCm: 172 });
    expect(await walkHeight()).toMatchObject({ heightCm: 172, heightCarried: true });
    await post(`/api/body-sizes/${id}/void`, { version: 2, reason: 'wrong-patient' });
    expect(await walkHeight()).toMatchObject({ heightCm: 180, heightCarried: true });
    expect((await values('bmi'))[0]).toBeCloseTo(81 / 1.8 ** 2, 1);
  });

  it('carries no stated height, none from later and none older than 12 months', async () => {
    patientId = await addPatient(own);
    await addBodySize(own, patientId, { takenAt: '2025-06-09T15:00:00Z', heightCm: 181 });
    await addBodySize(own, patientId, { takenAt: '2026-06-09T15:00:00Z', heightCm: 178, heightMethod: 'stated' });
    await addBodySize(own, patientId, { takenAt: '2026-06-11T15:00:00Z', heightCm: 175 });
    await addMeasurement(own, patientId);
    const [without] = await points('sixMinuteWalkDistance');
    expect(without).toMatchObject({ heightCm: null });
    expect(without).not.toHaveProperty('heightCarried');
    await addBodySize(own, patientId, { takenAt: '2025-06-12T15:00:00Z', heightCm: 176 });
    expect((await points('sixMinuteWalkDistance'))[0]).toMatchObject({ heightCm: 176, heightCarried: true });
  });

  it('works RV/TLC out from both volumes of one test and takes it back', async () => {
    patientId = await addPatient(own);
    const volume = (measure: string, value: number) => ({
      measure,
      value,
      takenAt: '2026-06-10T15:00:00Z',
      conditions: { method: 'plethysmography' },
      heightCm: 174.5,
    });
    await addMeasurement(own, patientId, volume('tlc', 8));
    expect(await values('rvtlc')).toEqual([]);
    const rv = await addMeasurement(own, patientId, volume('rv', 4));
    expect(await values('rvtlc')).toEqual([50]);
    await post(`/api/measurements/${rv.id}/amend`, { version: 1, reason: 'Typed wrong', value: 4.8 });
    expect(await values('rvtlc')).toEqual([60]);
    const derived = (await points('rvtlc'))[0]!;
    const own_ = await selectRow<{ id: string }>(`select id from measurements where source_id = $id`, {
      id: derived.sourceId,
    });
    const direct = await post(`/api/measurements/${own_!.id}/void`, { version: 1, reason: 'duplicate' });
    expect(direct.body.type).toBe('/problems/wrong-state');
    await post(`/api/measurements/${rv.id}/void`, { version: 2, reason: 'duplicate' });
    expect(await values('rvtlc')).toEqual([]);
  });

  it('of a diagnosis returns to the one before', async () => {
    patientId = await addPatient(own);
    const { id } = await addFileEntry(
      own,
      patientId,
      fileBody('diagnosis', { diagnosisGroup: 'ild' }, { on: '2026-06-15' }),
    );
    expect((await read(`/api/patients/${patientId}`)).patient.diagnosisGroup).toBe('ild');
    await post(`/api/file-entries/${id}/void`, { version: 1, reason: 'wrong-patient' });
    expect((await read(`/api/patients/${patientId}`)).patient.diagnosisGroup).toBe('copd');
  });
});
