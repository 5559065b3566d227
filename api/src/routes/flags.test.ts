import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { selectRow, selectRows } from '../db/query';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { addMeasurement, addPatient, phq9Body } from '../testing/factories/scene';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;
let patientId: string;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
});
afterAll(() => server.close());

interface Flag {
  id: string;
  version: number;
  detail: string;
  sourceId: string;
  severity: string;
}

async function openFlags(as: 'coordinator' | 'therapist' | 'pulmonologist' = 'therapist'): Promise<Flag[]> {
  const { body } = await own.as[as].get(`/api/patients/${patientId}`);
  return body.patient.openFlags as Flag[];
}

const occurrences = async () =>
  await selectRows<{ sourceId: string; withdrawn: boolean }>(
    `select o.source_id as "sourceId", o.withdrawn_at is not null as withdrawn
     from flag_occurrences o join flags f on f.id = o.flag_id
     where f.patient_id = $patientId order by o.created_at, o.occurred_at`,
    { patientId },
  );
const amend = (id: string, version: number, changes: object) =>
  own.as.therapist.post(`/api/measurements/${id}/amend`, { version, reason: 'Asked again', ...changes });

// Rule OM-1: a ninth answer of 1 or more, or a missing one, is a safety matter at any total.
describe('the ninth answer of a PHQ-9', () => {
  const table: [number | string, number, boolean][] = [
    [0, 0, false],
    [0, 20, false],
    [1, 4, true],
    [2, 9, true],
    [3, 27, true],
    ['1', 4, true],
    ['not-answered', 4, true],
  ];
  it.each(table)('of %s at a total of %d: flag %s', async (item9, value, raised) => {
    patientId = await addPatient(own);
    const { id } = await addMeasurement(own, patientId, phq9Body(item9, value));
    const flags = await openFlags();
    expect(flags).toHaveLength(raised ? 1 : 0);
    if (raised) expect(flags[0]).toMatchObject({ sourceId: id, severity: 'safety', rule: 'safety-answer' });
    const stored = await own.as.therapist.get(`/api/measurements/${id}`);
    expect(stored.body.measurement).toMatchObject({ item9: String(item9), value });
  });

  it('stands in the header for all three clinical roles and in the list', async () => {
    patientId = await addPatient(own, { familyName: 'Flagged' });
    await addMeasurement(own, patientId, phq9Body(1));
    for (const role of ['coordinator', 'therapist', 'pulmonologist'] as const)
      expect(await openFlags(role)).toHaveLength(1);
    const list = await own.as.coordinator.get('/api/patients?search=flagged');
    expect(list.body.items[0]).toMatchObject({ id: patientId, openFlags: 1 });
  });

  it('never shows on a patient\u2019s own page', async () => {
    patientId = own.users.patient.patientId!;
    await addMeasurement(own, patientId, phq9Body(3));
    const home = await own.as.patient.get('/api/me/home');
    expect(home.text).not.toMatch(/flag|ninth|phq/i);
  });
});

describe('one open flag a patient and rule', () => {
  it('gathers occurrences, and closes when the last is amended to 0 or voided', async () => {
    patientId = await addPatient(own);
    const first = await addMeasurement(own, patientId, phq9Body(1, 4, '2026-06-01T15:00:00Z'));
    const second = await addMeasurement(own, patientId, phq9Body('not-answered', 5, '2026-06-08T15:00:00Z'));
    const [flag, ...more] = await openFlags();
    expect(more).toEqual([]);
    expect(flag!.sourceId).toBe(second.id);
    expect(await occurrences()).toEqual([
      { sourceId: first.id, withdrawn: false },
      { sourceId: second.id, withdrawn: false },
    ]);

    expect((await amend(first.id, 1, { item9: 0 })).status).toBe(200);
    expect((await openFlags()).map(({ id }) => id)).toEqual([flag!.id]);
    const voided = await own.as.therapist.post(`/api/measurements/${second.id}/void`, {
      version: 1,
      reason: 'duplicate',
    });
    expect(voided.status).toBe(200);
    expect(await openFlags()).toEqual([]);
    expect((await occurrences()).every((one) => one.withdrawn)).toBe(true);
    const row = await selectRow<{ status: string; resolution: string }>(
      'select status, resolution from flags where id = $id',
      {
        id: flag!.id,
      },
    );
    expect(row).toMatchObject({ status: 'resolved', resolution: expect.stringMatching(/amended or voided/) });
  });

  it('is raised by an amendment, follows its answer, and is not doubled by one that changes nothing', async () => {
    patientId = await addPatient(own);
    const { id } = await addMeasurement(own, patientId, phq9Body(0));
    expect(await openFlags()).toEqual([]);
    await amend(id, 1, { item9: 1 });
    const [raised] = await openFlags();
    expect(raised!.detail).toMatch(/1 of 3/);
    await amend(id, 2, { note: 'Asked twice' });
    expect(await openFlags()).toHaveLength(1);
    expect(await occurrences()).toHaveLength(1);
    await amend(id, 3, { item9: 3 });
    expect((await openFlags())[0]!.detail).toMatch(/3 of 3/);
  });

  it('stays one when two results arrive at once', async () => {
    patientId = await addPatient(own);
    const record = (item9: number) => own.as.therapist.post(`/api/patients/${patientId}/measurements`, phq9Body(item9));
    const answers = await Promise.all([record(1), record(2), record(3)]);
    expect(answers.map((answer) => answer.status)).toEqual([201, 201, 201]);
    expect(await openFlags()).toHaveLength(1);
    expect(await occurrences()).toHaveLength(3);
  });
});

describe('resolving a flag', () => {
  const resolve = (as: 'coordinator' | 'therapist' | 'pulmonologist', flag: Flag, note: string) =>
    own.as[as].post(`/api/flags/${flag.id}/resolve`, { version: flag.version, note });

  it('takes a note, keeps who and when, and is not for the coordinator', async () => {
    patientId = await addPatient(own);
    await addMeasurement(own, patientId, phq9Body(1));
    const [flag] = await openFlags();
    expect((await resolve('coordinator', flag!, 'Called')).status).toBe(403);
    expect((await resolve('therapist', flag!, '  ')).body.errors[0].path).toBe('note');
    expect(await openFlags()).toHaveLength(1);
    const done = await resolve('therapist', flag!, 'Called today; safe');
    expect(done.body.flag).toMatchObject({ id: flag!.id, status: 'resolved' });
    expect(await openFlags()).toEqual([]);
    const row = await selectRow('select resolved_by as by, resolved_at as at, resolution from flags where id = $id', {
      id: flag!.id,
    });
    expect(row).toEqual({ by: own.users.therapist.id, at: server.clock.now(), resolution: 'Called today; safe' });
    const again = await resolve('pulmonologist', { ...flag!, version: done.body.flag.version as number }, 'Again');
    expect(again.body.type).toBe('/problems/wrong-state');
  });

  it('is refused when a new result changed the flag meanwhile, and a later one opens a new flag', async () => {
    patientId = await addPatient(own);
    await addMeasurement(own, patientId, phq9Body(1, 4, '2026-06-01T15:00:00Z'));
    const [seen] = await openFlags();
    server.clock.advance(60_000);
    await addMeasurement(own, patientId, phq9Body(3, 9, '2026-06-08T15:00:00Z'));
    expect((await resolve('therapist', seen!, 'Called')).status).toBe(409);
    const [current] = await openFlags();
    expect((await resolve('pulmonologist', current!, 'Seen in clinic')).status).toBe(200);
    await addMeasurement(own, patientId, phq9Body(2, 9, '2026-06-09T15:00:00Z'));
    const [fresh] = await openFlags();
    expect(fresh!.id).not.toBe(current!.id);
  });
});
