import { hashToken } from '@slighthill/api/auth/tokens';
import { randomUUID } from 'node:crypto';
import type pg from 'pg';

export interface BenchClinic {
  clinicId: string;
  userId: string;
  /** Has 40 results of each of six measures. */
  patientId: string;
  cookie: string;
}

const measures = ['fev1', 'fvc', 'fev1fvc', 'tlc', 'sixMinuteWalkDistance', 'cat'];
const spirometry = new Set(['fev1', 'fvc', 'fev1fvc']);
const base: Record<string, number> = {
  fev1: 1320,
  fvc: 2780,
  fev1fvc: 0.475,
  tlc: 7400,
  sixMinuteWalkDistance: 310,
  cat: 20,
};

/** A clinic with as many patients as asked, written in bulk; every third has an enrollment with a summary. */
export async function fillClinic(client: pg.Client, patients: number): Promise<BenchClinic> {
  const [clinicId, userId, programId, patientId] = [randomUUID(), randomUUID(), randomUUID(), randomUUID()];
  const now = new Date();
  await client.query(
    `insert into clinics (id, name, time_zone, created_at, updated_at) values ($1, 'Bench', 'America/Denver', $2, $2)`,
    [clinicId, now],
  );
  await client.query(
    `insert into users (id, clinic_id, email, display_name, roles, created_at, updated_at)
     values ($1, $2, $3, 'Bench coordinator', '{coordinator}', $4, $4)`,
    [userId, clinicId, `${userId}@bench.test`, now],
  );
  await client.query(
    `insert into programs (id, clinic_id, name, planned_sessions, weeks, sessions_per_day, sessions_per_week,
       session_kinds, created_at, updated_at)
     values ($1, $2, 'Standard', 24, 12, 1, 2, '{exercise}', $3, $3)`,
    [programId, clinicId, now],
  );
  await fillPatients(client, clinicId, programId, patients, now);
  await fillShowcase(client, { clinicId, userId, programId, patientId }, now);
  const token = randomUUID();
  await client.query(
    `insert into auth_sessions (id, token_hash, user_id, expires_at, last_active_at, created_at)
     values ($1, $2, $3, $4, $5, $5)`,
    [randomUUID(), hashToken(token), userId, new Date(now.getTime() + 12 * 3_600_000), now],
  );
  await client.query('vacuum analyze');
  return { clinicId, userId, patientId, cookie: `slighthill=${token}` };
}

/** Names from 97 x 89 syllable pairs, spread evenly, so that a prefix finds its share of the clinic. */
async function fillPatients(client: pg.Client, clinicId: string, programId: string, count: number, now: Date) {
  const letters = `(array['ba','de','fi','go','hu','ka','le','mi','no','pu','ra','se','ti','vo','wu'])`;
  const syllable = (step: number) => `${letters}[1 + (n / ${step}) % 15]`;
  await client.query(
    `insert into patients (id, clinic_id, given_name, family_name, given_key, family_key, birth_date,
       sex_for_prediction, diagnosis_group, record_number, record_key, list, created_at, updated_at)
     select gen_random_uuid(), $1, given, family, given, family, date '1940-01-01' + (n * 37) % 18000,
       (array['male', 'female'])[1 + n % 2], (array['copd', 'ild', 'asthma'])[1 + n % 3], n::text, n::text,
       case when n % 3 = 0 then 'current' else 'none' end, $3, $3
     from (select n, ${syllable(1)} || ${syllable(15)} || ${syllable(225)} as family,
       ${syllable(7)} || ${syllable(49)} || ${syllable(343)} as given from generate_series(1, $2::int) n) made`,
    [clinicId, count, now],
  );
  await client.query(
    `insert into enrollments (id, clinic_id, patient_id, program_id, status, start_on, planned_end_on,
       planned_sessions, created_at, updated_at)
     select gen_random_uuid(), clinic_id, id, $2, 'active', current_date - 30, current_date + 54, 24, $3, $3
     from patients where clinic_id = $1 and list = 'current'`,
    [clinicId, programId, now],
  );
  await client.query(
    `insert into enrollment_summaries (enrollment_id, clinic_id, patient_id, pattern, last_test_on, computed_at)
     select id, clinic_id, patient_id, '{"id":"obstruction","heading":"Obstructive pattern, severe","provisional":false,
       "takenOn":"2026-01-05","bandId":"severe"}', current_date - 20, $2 from enrollments where clinic_id = $1`,
    [clinicId, now],
  );
}

async function fillShowcase(
  client: pg.Client,
  ids: { clinicId: string; userId: string; programId: string; patientId: string },
  now: Date,
) {
  await client.query(
    `insert into patients (id, clinic_id, given_name, family_name, given_key, family_key, birth_date,
       sex_for_prediction, diagnosis_group, record_number, record_key, list, created_at, updated_at)
     values ($1, $2, 'Bench', 'Zenith', 'bench', 'zenith', '1959-03-02', 'male', 'copd', 'B1', 'b1', 'current', $3, $3)`,
    [ids.patientId, ids.clinicId, now],
  );
  await client.query(
    `insert into enrollments (id, clinic_id, patient_id, program_id, status, start_on, planned_end_on,
       planned_sessions, created_at, updated_at)
     values ($1, $2, $3, $4, 'active', current_date - 60, current_date + 24, 24, $5, $5)`,
    [randomUUID(), ids.clinicId, ids.patientId, ids.programId, now],
  );
  for (const measure of measures)
    for (let n = 40; n > 0; n -= 1)
      await storePoint(client, ids, measure, new Date(now.getTime() - n * 9 * 86_400_000));
}

/** Stores one result the way the services lay it out. */
export async function storePoint(
  client: pg.Client | pg.Pool,
  ids: { clinicId: string; userId: string; patientId: string },
  measure: string,
  at: Date,
  sourceId: string | null = null,
) {
  const isSpirometry = spirometry.has(measure);
  const spread = 1 + 0.05 * Math.sin(at.getTime() / 86_400_000);
  const value = (base[measure] ?? 1) * spread;
  const id = randomUUID();
  await client.query(
    `insert into measurements (id, clinic_id, patient_id, measure, taken_at, value, state, conditions, height_cm,
       height_method, weight_kg, source_kind, source_id, recorded_by, created_at, updated_at)
     values ($1, $2, $3, $4, $5, $6, $7, $8, 174.5, 'measured', 78, $9, $11, $10, now(), now())`,
    [
      id,
      ids.clinicId,
      ids.patientId,
      measure,
      at,
      measure === 'fev1fvc' ? value : Math.round(value),
      isSpirometry ? 'after' : null,
      conditionsOf(measure),
      isSpirometry ? 'spirometry-test' : 'measurement',
      ids.userId,
      sourceId ?? id,
    ],
  );
}

function conditionsOf(measure: string): object {
  if (measure === 'tlc') return { method: 'plethysmography' };
  return measure === 'sixMinuteWalkDistance' ? { courseM: 30, walks: 2 } : {};
}
