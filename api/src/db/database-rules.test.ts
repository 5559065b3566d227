import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { execute } from '../db/query';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import {
  addEnrollment,
  addFileEntry,
  addMeasurement,
  addPatient,
  addSpirometry,
  newId,
  phq9Body,
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

describe('the database itself', () => {
  it('refuses to delete clinical rows and to change the trail or the kept revisions', async () => {
    patientId = await addPatient(own);
    const enrollment = await addEnrollment(own, patientId);
    const { id } = await addMeasurement(own, patientId, { ...phq9Body(1), heightCm: 170 });
    await own.as.therapist.post(`/api/measurements/${id}/amend`, { version: 1, reason: 'Typed wrong', value: 7 });
    await addSpirometry(own, patientId);
    await addFileEntry(own, patientId);
    expect(enrollment.version).toBe(1);
    const bind = { patientId };
    for (const table of ['body_sizes', 'spirometry_tests', 'measurements', 'file_entries', 'flags', 'enrollments'])
      await expect(execute(`delete from ${table} where patient_id = $patientId`, bind), table).rejects.toThrow(
        /never deleted/,
      );
    await expect(execute('delete from patients where id = $patientId', bind)).rejects.toThrow(/never deleted/);
    for (const statement of [
      `update clinical_revisions set reason = 'x' where patient_id = $patientId`,
      'delete from clinical_revisions where patient_id = $patientId',
      `update audit_events set action = 'x' where $patientId::uuid = any (patient_ids)`,
      'delete from audit_events where $patientId::uuid = any (patient_ids)',
    ])
      await expect(execute(statement, bind), statement).rejects.toThrow(/append-only/);
  });

  it('holds the ranges on its own', async () => {
    patientId = await addPatient(own);
    const { id } = await addSpirometry(own, patientId);
    for (const change of ['fev1_ml = fvc_ml + 1', 'height_cm = 65', `bronchodilator = 'post'`, 'version = 0'])
      await expect(execute(`update spirometry_tests set ${change} where id = $id`, { id }), change).rejects.toThrow(
        /check/,
      );
  });

  it('holds one open enrollment a patient and one clinic a record on its own', async () => {
    patientId = await addPatient(own);
    const other = await makeClinic(server);
    const insert = (clinicId: string, programId: string) =>
      execute(
        `insert into enrollments (id, clinic_id, patient_id, program_id, status, start_on, planned_end_on,
           planned_sessions, created_at, updated_at)
         values ($id, $clinicId, $patientId, $programId, 'planned', '2026-03-02', '2026-05-25', 24, now(), now())`,
        { id: newId(), clinicId, patientId, programId },
      );
    await expect(insert(other.clinic.id, other.program.id)).rejects.toThrow(/foreign key/);
    await insert(own.clinic.id, own.program.id);
    await expect(insert(own.clinic.id, own.program.id)).rejects.toMatchObject({
      parent: { constraint: 'enrollments_one_open' },
    });
  });
});
