import type { Problem } from '@slighthill/shared/errors';
import type { Response } from 'supertest';
import { expect } from 'vitest';
import { selectRow } from '../db/query';

const tables = [
  'patients',
  'enrollments',
  'body_sizes',
  'spirometry_tests',
  'maneuvers',
  'measurements',
  'file_entries',
  'clinical_revisions',
  'flags',
  'audit_events',
  'created_ids',
  'users',
  'programs',
];

/** Everything the clinic has stored, by its content, so that a changed row shows as well as a new one. */
export async function storedIn(clinicId: string): Promise<Record<string, string>> {
  const digest = (table: string) =>
    `(select count(*) || ' ' || coalesce(md5(string_agg(t::text, '' order by t::text)), '') from ${table} t
      where t.clinic_id = $clinicId) as ${table}`;
  const row = await selectRow<Record<string, string>>(`select ${tables.map(digest).join(', ')}`, {
    clinicId,
  });
  return row!;
}

/** Sends what must be refused, and holds that a problem comes back and nothing is stored. */
export async function refused(clinicId: string, send: () => Promise<Response>, status: number): Promise<Problem> {
  const before = await storedIn(clinicId);
  const response = await send();
  expect(response.status).toBe(status);
  expect(response.headers['content-type']).toMatch(/^application\/problem\+json/);
  const problem = response.body as Problem;
  expect(problem).toMatchObject({
    type: expect.stringMatching(/^\/problems\/[a-z-]+$/),
    title: expect.any(String),
    status,
  });
  expect(problem.detail.length).toBeGreaterThan(10);
  expect(await storedIn(clinicId)).toEqual(before);
  return problem;
}
