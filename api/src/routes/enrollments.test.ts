import type { EnrollmentStatus } from '@slighthill/shared/contracts/patient';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { selectRow, selectRows } from '../db/query';
import { spirometryBody } from '../testing/factories/bodies';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { addEnrollment, addPatient, addSpirometry, newId } from '../testing/factories/scene';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
});
afterAll(() => server.close());

const coordinator = () => own.as.coordinator;
const enroll = (patientId: string, changes: object = {}) =>
  coordinator().post(`/api/patients/${patientId}/enrollments`, {
    programId: own.program.id,
    startOn: '2026-03-02',
    ...changes,
  });
const patch = (id: string, version: number, changes: object) =>
  coordinator().patch(`/api/enrollments/${id}`, { version, ...changes });

describe('enrolling', () => {
  it('takes the program\u2019s numbers and shows in header, list and home', async () => {
    const patientId = await addPatient(own, { familyName: 'Enrolled' });
    const { body } = await enroll(patientId, { consentOn: '2026-03-01' });
    expect(body.enrollment).toMatchObject({
      programName: 'Standard course',
      plannedSessions: 24,
      status: 'planned',
      startOn: '2026-03-02',
      plannedEndOn: '2026-05-25',
      endedOn: null,
      consentOn: '2026-03-01',
      version: 1,
    });
    const header = await coordinator().get(`/api/patients/${patientId}`);
    expect(header.body.patient.enrollment.id).toBe(body.enrollment.id);
  });

  it('is for one open enrollment a patient, also when two arrive at once', async () => {
    const patientId = await addPatient(own);
    const answers = await Promise.all([enroll(patientId), enroll(patientId, { id: newId() }), enroll(patientId)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409, 409]);
    const { id } = answers.find((answer) => answer.status === 201)!.body.enrollment as { id: string };
    await patch(id, 1, { status: 'withdrawn', reason: 'Moved away' }).expect(200);
    expect((await enroll(patientId)).status).toBe(201);
    const count = await selectRow('select count(*)::int as count from enrollments where patient_id = $patientId', {
      patientId,
    });
    expect(count).toEqual({ count: 2 });
  });

  it('refuses a program that is retired or another clinic\u2019s', async () => {
    const patientId = await addPatient(own);
    const other = await makeClinic(server);
    expect((await enroll(patientId, { programId: other.program.id })).body.errors[0].path).toBe('programId');
    const created = await own.as.administrator.post('/api/programs', {
      name: 'Old course',
      plannedSessions: 10,
      weeks: 5,
      sessionsPerDay: 1,
      sessionsPerWeek: 2,
      sessionKinds: ['exercise'],
    });
    const program = created.body.program as { id: string };
    await own.as.administrator.patch(`/api/programs/${program.id}`, { version: 1, retired: true }).expect(200);
    expect((await enroll(patientId, { programId: program.id })).body.errors[0].path).toBe('programId');
    expect((await enroll(patientId, { startOn: '1950-01-01' })).body.errors[0].path).toBe('startOn');
  });
});

describe('the states of an enrollment', () => {
  const reasoned = { reason: 'As agreed' };
  const ways: Record<EnrollmentStatus, EnrollmentStatus[]> = {
    planned: [],
    active: ['active'],
    paused: ['active', 'paused'],
    completed: ['active', 'completed'],
    'partly-completed': ['active', 'partly-completed'],
    withdrawn: ['withdrawn'],
  };
  const allowed: Record<EnrollmentStatus, EnrollmentStatus[]> = {
    planned: ['active', 'withdrawn'],
    active: ['paused', 'completed', 'partly-completed', 'withdrawn'],
    paused: ['active', 'completed', 'partly-completed', 'withdrawn'],
    completed: [],
    'partly-completed': [],
    withdrawn: [],
  };
  const states = Object.keys(ways) as EnrollmentStatus[];
  const pairs = states.flatMap((from) => states.filter((to) => to !== from).map((to) => [from, to] as const));

  it.each(pairs)('from %s to %s', async (from, to) => {
    const { id } = await addEnrollment(own, await addPatient(own));
    let version = 1;
    for (const status of ways[from]) {
      await patch(id, version, { status, ...reasoned }).expect(200);
      version += 1;
    }
    const answer = await patch(id, version, { status: to, ...reasoned });
    if (allowed[from].includes(to)) {
      expect(answer.body.enrollment).toMatchObject({ status: to, version: version + 1 });
      const isEnd = ['completed', 'partly-completed', 'withdrawn'].includes(to);
      expect(answer.body.enrollment.endedOn).toBe(isEnd ? '2026-06-15' : null);
    } else expect(answer.body.type).toBe('/problems/wrong-state');
  });

  it('need a reason to pause, end early or withdraw, and none to begin or complete', async () => {
    const { id } = await addEnrollment(own, await addPatient(own));
    const withoutReason = async (version: number, status: EnrollmentStatus) =>
      (await patch(id, version, { status })).body;
    expect((await withoutReason(1, 'withdrawn')).errors[0].path).toBe('reason');
    expect((await withoutReason(1, 'active')).enrollment.status).toBe('active');
    for (const status of ['paused', 'partly-completed', 'withdrawn'] as const)
      expect((await withoutReason(2, status)).errors[0].path).toBe('reason');
    expect((await withoutReason(2, 'completed')).enrollment.status).toBe('completed');
  });

  it('end neither before they start nor in the future, and an ended one is not moved', async () => {
    const { id } = await addEnrollment(own, await addPatient(own));
    const end = (endedOn: string) => patch(id, 1, { status: 'withdrawn', endedOn, ...reasoned });
    for (const endedOn of ['2026-03-01', '2026-06-16'])
      expect((await end(endedOn)).body.errors[0].path).toBe('endedOn');
    expect((await end('2026-03-02')).body.enrollment.endedOn).toBe('2026-03-02');
    expect((await patch(id, 2, { startOn: '2026-02-02' })).status).toBe(409);
  });

  it('that never began may be withdrawn before their start', async () => {
    const { id } = await addEnrollment(own, await addPatient(own), { startOn: '2026-07-06' });
    const answer = await patch(id, 1, { status: 'withdrawn', ...reasoned });
    expect(answer.body.enrollment).toMatchObject({ status: 'withdrawn', endedOn: '2026-07-06' });
  });

  it('move their planned end with their start', async () => {
    const { id } = await addEnrollment(own, await addPatient(own));
    const answer = await patch(id, 1, { startOn: '2026-03-16' });
    expect(answer.body.enrollment).toMatchObject({ startOn: '2026-03-16', plannedEndOn: '2026-06-08' });
  });

  it('decide whether a patient stands in the current or the finished list', async () => {
    const patientId = await addPatient(own, { familyName: 'Listed' });
    const lists = async () => {
      const found: string[] = [];
      for (const list of ['current', 'finished', 'all']) {
        const { body } = await coordinator().get(`/api/patients?search=listed&list=${list}`);
        if ((body.items as { id: string }[]).some((item) => item.id === patientId)) found.push(list);
      }
      return found;
    };
    expect(await lists()).toEqual(['all']);
    const { id } = await addEnrollment(own, patientId);
    expect(await lists()).toEqual(['current', 'all']);
    await patch(id, 1, { status: 'active' }).expect(200);
    await patch(id, 2, { status: 'completed' }).expect(200);
    expect(await lists()).toEqual(['finished', 'all']);
    await addEnrollment(own, patientId, { startOn: '2026-06-10' });
    expect(await lists()).toEqual(['current', 'all']);
  });

  it('anchor the trend of the enrollment that is asked for', async () => {
    const patientId = await addPatient(own);
    const first = await addEnrollment(own, patientId, { startOn: '2025-03-03' });
    await patch(first.id, 1, { status: 'withdrawn', endedOn: '2025-04-30', ...reasoned }).expect(200);
    const second = await addEnrollment(own, patientId, { startOn: '2026-03-02' });
    for (const day of ['2025-02-20', '2025-04-20', '2026-02-20', '2026-06-01'])
      await addSpirometry(own, patientId, spirometryBody({ performedAt: `${day}T18:00:00Z` }));
    const trend = async (query: string) =>
      (await own.as.pulmonologist.get(`/api/patients/${patientId}/trends?measures=fev1${query}`)).body;
    const baselineOf = async (query: string) => (await trend(query)).series[0].baseline.takenOn as string;
    expect((await trend('')).enrollment.id).toBe(second.id);
    expect(await baselineOf('')).toBe('2026-02-20');
    expect(await baselineOf(`&enrollment=${first.id}`)).toBe('2025-02-20');
    expect((await trend(`&enrollment=${newId()}`)).errors[0].path).toBe('enrollment');
  });
});

describe('changing an enrollment', () => {
  it('says what it does not use, and corrects a wrong end date with a reason', async () => {
    const patientId = await addPatient(own);
    const { id } = await addEnrollment(own, patientId, { startOn: '2026-03-02' });
    const patch = (body: object) => own.as.coordinator.patch(`/api/enrollments/${id}`, body);
    const refusedAt = async (body: object) => {
      const answer = await patch(body);
      expect(answer.status).toBe(422);
      return answer.body.errors.map((error: { path: string }) => error.path);
    };
    expect(await refusedAt({ version: 1, endedOn: '2026-05-01' })).toEqual(['endedOn']);
    expect(await refusedAt({ version: 1, reason: 'no change' })).toEqual(['reason']);
    expect(await refusedAt({ version: 1, consentOn: '2057-01-01' })).toEqual(['consentOn']);
    await patch({ version: 1, status: 'active' }).expect(200);
    await patch({ version: 2, status: 'completed', endedOn: '2026-05-20' }).expect(200);
    expect(await refusedAt({ version: 3, endedOn: '2026-05-25' })).toEqual(['reason']);
    const corrected = await patch({ version: 3, endedOn: '2026-05-25', reason: 'typed wrong' }).expect(200);
    expect(corrected.body.enrollment).toMatchObject({ endedOn: '2026-05-25', status: 'completed' });
  });

  it('keeps what the changed fields said before in the audit event', async () => {
    const patientId = await addPatient(own);
    await own.as.coordinator.patch(`/api/patients/${patientId}`, { version: 1, birthDate: '1960-01-02' }).expect(200);
    const [event] = await selectRows<{ detail: object }>(
      `select detail from audit_events where action = 'patient.change' and $patientId::uuid = any (patient_ids)`,
      { patientId },
    );
    expect(event?.detail).toEqual({ before: { birthDate: '1959-03-02' } });
  });
});
