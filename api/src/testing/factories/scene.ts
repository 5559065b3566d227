import { randomUUID } from 'node:crypto';
import { expect } from 'vitest';
import type { Client } from '../server';
import { patientBody, spirometryBody, walkBody } from './bodies';
import type { TestClinic } from './clinic';

/** An entry as a test needs it to go on: where it is and which version it has. */
export interface Entry {
  id: string;
  version: number;
}

export async function created(client: Client, path: string, body: object, key: string): Promise<Entry> {
  const response = await client.post(path, body);
  expect(response.body).toHaveProperty(key);
  expect(response.status).toBe(201);
  const { id, version } = response.body[key] as Entry;
  return { id, version };
}

export async function addPatient(clinic: TestClinic, changes: object = {}): Promise<string> {
  return (await created(clinic.as.coordinator, '/api/patients', patientBody(changes), 'patient')).id;
}

export async function addEnrollment(clinic: TestClinic, patientId: string, changes: object = {}): Promise<Entry> {
  const body = { programId: clinic.program.id, startOn: '2026-03-02', ...changes };
  return await created(clinic.as.coordinator, `/api/patients/${patientId}/enrollments`, body, 'enrollment');
}

export async function addSpirometry(clinic: TestClinic, patientId: string, changes: object = {}): Promise<Entry> {
  return await created(
    clinic.as.therapist,
    `/api/patients/${patientId}/spirometry-tests`,
    spirometryBody(changes),
    'test',
  );
}

export async function addMeasurement(
  clinic: TestClinic,
  patientId: string,
  body: object = walkBody(310),
): Promise<Entry> {
  return await created(clinic.as.therapist, `/api/patients/${patientId}/measurements`, body, 'measurement');
}

export async function addBodySize(clinic: TestClinic, patientId: string, changes: object = {}): Promise<Entry> {
  const body = { takenAt: '2026-06-01T15:00:00Z', heightCm: 174.5, weightKg: 80, ...changes };
  return await created(clinic.as.therapist, `/api/patients/${patientId}/body-sizes`, body, 'bodySize');
}

export const fileBody = (kind: string, details: object, changes: object = {}) => ({
  kind,
  on: '2026-06-01',
  details,
  ...changes,
});

export const orderDetails = (outside: boolean) => ({
  restLpm: 2,
  device: 'concentrator',
  prescriber: 'Test prescriber',
  outside,
});

export async function addFileEntry(
  clinic: TestClinic,
  patientId: string,
  body: object = fileBody('smoking', { status: 'former', packYears: 30 }),
): Promise<Entry> {
  return await created(clinic.as.pulmonologist, `/api/patients/${patientId}/file-entries`, body, 'entry');
}

export const phq9Body = (item9: number | string, value = 6, takenAt = '2026-06-10T15:00:00Z') => ({
  measure: 'phq9',
  takenAt,
  value,
  item9,
});

/** A patient with an open safety flag, as the record's header shows it. */
export async function addFlag(clinic: TestClinic, patientId: string): Promise<Entry> {
  await addMeasurement(clinic, patientId, phq9Body(1));
  const response = await clinic.as.therapist.get(`/api/patients/${patientId}`);
  const { id, version } = response.body.patient.openFlags[0] as Entry;
  return { id, version };
}

export async function versionOf(client: Client, path: string, key: string): Promise<number> {
  const response = await client.get(path);
  return (response.body[key] as Entry).version;
}

export const newId = (): string => randomUUID();
