import { Client as Connection } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { selectRow } from '../db/query';
import { testDatabaseUrl } from '../testing/database';
import { patientBody, spirometryBody, walkBody } from '../testing/factories/bodies';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { addPatient, newId } from '../testing/factories/scene';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;
let beside: Connection;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
  beside = new Connection({ connectionString: await testDatabaseUrl(), application_name: 'beside' });
  await beside.connect();
});
afterAll(async () => {
  await beside.end();
  await server.close();
});

/** Ends the API's own connections, as a restart of the database would. */
async function cutConnections(): Promise<number> {
  const { rowCount } = await beside.query(
    `select pg_terminate_backend(pid) from pg_stat_activity
     where datname = current_database() and application_name = 'slighthill'`,
  );
  return rowCount ?? 0;
}

const waiting = async () =>
  (
    await beside.query<{ count: number }>(
      `select count(*)::int as count from pg_stat_activity
       where datname = current_database() and application_name = 'slighthill' and wait_event_type = 'Lock'`,
    )
  ).rows[0]!.count;

const countOf = async (table: string, patientId: string) =>
  (await selectRow<{ count: number }>(`select count(*)::int as count from ${table} where patient_id = $patientId`, {
    patientId,
  }))!.count;

describe('losing the database', () => {
  it('in the middle of a command answers 503 and stores no half of it', async () => {
    const patientId = await addPatient(own);
    const before = await countOf('file_entries', patientId);
    // holds the patient's row, so that the command stands inside its transaction
    await beside.query('begin');
    await beside.query('select id from patients where id = $1 for update', [patientId]);
    const body = { tests: [spirometryBody({ bronchodilator: 'before' }), spirometryBody()] };
    const sent = own.as.therapist.post(`/api/patients/${patientId}/spirometry-tests`, body).then((answer) => answer);
    await expect.poll(waiting, { timeout: 10_000 }).toBe(1);
    expect(await cutConnections()).toBeGreaterThan(0);
    await beside.query('rollback');
    const answer = await sent;
    expect(answer.status).toBe(503);
    expect(answer.headers['retry-after']).toBe('2');
    expect(answer.headers['content-type']).toMatch(/^application\/problem\+json/);
    expect(answer.body.type).toBe('/problems/unavailable');
    for (const table of ['spirometry_tests', 'measurements', 'body_sizes'])
      expect(await countOf(table, patientId)).toBe(0);
    expect(await countOf('file_entries', patientId)).toBe(before);
    expect((await own.as.therapist.post(`/api/patients/${patientId}/spirometry-tests`, body)).status).toBe(201);
  });

  it('between requests is not noticed for long', async () => {
    await cutConnections();
    await expect
      .poll(async () => (await own.as.coordinator.get('/api/patients')).status, { timeout: 10_000 })
      .toBe(200);
    await server.anonymous.get('/api/health/ready').expect(200);
  });

  it('under load ends in 503 or success, and sending again with the same ids stores each once and whole', async () => {
    const bodies = Array.from({ length: 24 }, () => patientBody({ id: newId() }));
    const send = () => Promise.all(bodies.map((body) => own.as.coordinator.post('/api/patients', body)));
    const first = send();
    await expect.poll(cutConnections, { timeout: 10_000 }).toBeGreaterThan(0);
    const statuses = (await first).map((answer) => answer.status);
    expect(statuses.filter((status) => status !== 201 && status !== 503)).toEqual([]);
    let again: number[] = [];
    await expect
      .poll(
        async () => {
          again = (await send()).map((answer) => answer.status);
          return again.every((status) => status === 200 || status === 201);
        },
        { timeout: 10_000 },
      )
      .toBe(true);
    for (const { id } of bodies as unknown as { id: string }[]) {
      expect(await countOf('file_entries', id)).toBe(1);
      expect(await selectRow('select count(*)::int as count from patients where id = $id', { id })).toEqual({
        count: 1,
      });
    }
  });

  it('does not keep a process from saying that it is alive', async () => {
    const health = server.anonymous.get('/api/health');
    await cutConnections();
    expect((await health).status).toBe(200);
  });
});

describe('a statement that fails at the end of a command', () => {
  it('takes everything before it along', async () => {
    const patientId = await addPatient(own);
    const before = await selectRow('select count(*)::int as count from audit_events');
    // the summary is written last; without its table the whole command must go
    await own.as.coordinator
      .post(`/api/patients/${patientId}/enrollments`, { programId: own.program.id, startOn: '2026-03-02' })
      .expect(201);
    await beside.query(
      `alter table enrollment_summaries add constraint shut check (patient_id <> '${patientId}') not valid`,
    );
    try {
      const answer = await own.as.therapist.post(`/api/patients/${patientId}/measurements`, {
        ...walkBody(310),
        heightCm: 170,
      });
      expect(answer.status).toBe(500);
      expect(answer.text).not.toMatch(/shut|constraint|insert/i);
      for (const table of ['measurements', 'body_sizes']) expect(await countOf(table, patientId)).toBe(0);
      const after = await selectRow<{ count: number }>('select count(*)::int as count from audit_events');
      expect(after!.count).toBe((before as { count: number }).count + 1);
    } finally {
      await beside.query('alter table enrollment_summaries drop constraint shut');
    }
    expect((await own.as.therapist.post(`/api/patients/${patientId}/measurements`, walkBody(310))).status).toBe(201);
  });
});
