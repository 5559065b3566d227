import { connectDatabase } from '@slighthill/api/db/connect';
import { passwordMatches } from '@slighthill/api/auth/passwords';
import { User } from '@slighthill/api/models/user';
import { rebuildEnrollmentSummaries } from '@slighthill/api/services/rebuild-enrollment-summaries';
import { diagnosisGroups, enrollmentStatuses } from '@slighthill/shared/contracts/patient';
import { Client } from 'pg';
import { QueryTypes, type Sequelize } from 'sequelize';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import '../test/provided';
import { withDatabase } from '../test/test-server';
import { alderFalls, demoPassword, stonebridge } from './demo-clinics';
import { isDatabaseEmpty, seedDemo } from './seed';

const { serverUrl, template } = inject('testDatabase');
// a name that begins like the template's is dropped with it, whatever happens here
const nameOf = (suffix: string) => `${template}_demo_${suffix}`;
const now = new Date('2026-10-14T16:12:00Z');
const slow = 240_000;

async function onServer(statement: string): Promise<void> {
  const client = new Client({ connectionString: serverUrl });
  await client.connect();
  try {
    await client.query(statement);
  } finally {
    await client.end();
  }
}

async function emptyDatabase(suffix: string): Promise<Sequelize> {
  await onServer(`create database ${nameOf(suffix)} template ${template}`);
  return connectDatabase(withDatabase(serverUrl, nameOf(suffix)));
}

const rowsOf = async <T extends object>(sequelize: Sequelize, sql: string): Promise<T[]> =>
  await sequelize.query<T>(sql, { type: QueryTypes.SELECT });

const countOf = async (sequelize: Sequelize, sql: string): Promise<number> =>
  (await rowsOf<{ count: number }>(sequelize, `select count(*)::int as count ${sql}`))[0]!.count;

/** Everything people would see of patients, tests and trail, without the ids the services make up themselves. */
const digestSql = `select md5(string_agg(line, '|' order by line)) as digest from (
  select concat_ws(',', 'p', id, given_name, family_name, birth_date, record_number, list, created_at) as line from patients
  union all select concat_ws(',', 'm', patient_id, enrollment_id, measure, taken_at, value, state, conditions, height_cm,
    height_carried, weight_kg, safety_answer, source_kind, recorded_by, voided_at, created_at, updated_at) from measurements
  union all select concat_ws(',', 's', id, visit_id, fev1_ml, fvc_ml, version) from spirometry_tests
  union all select concat_ws(',', 'f', id, kind, on_date, details, released_at) from file_entries where kind <> 'diagnosis'
  union all select concat_ws(',', 'e', id, status, start_on, ended_on) from enrollments
  union all select concat_ws(',', 'a', at, actor_id, action, patient_ids) from audit_events) lines`;

describe('two loads on the same day', () => {
  const loads: { digest: string }[] = [];

  beforeAll(async () => {
    for (const [suffix, at] of [
      ['a', now],
      ['b', new Date('2026-10-14T21:40:00Z')],
      ['c', new Date('2026-10-15T16:12:00Z')],
    ] as const) {
      const sequelize = await emptyDatabase(suffix);
      await seedDemo(sequelize, { patients: 5, now: at });
      loads.push(...(await rowsOf<{ digest: string }>(sequelize, digestSql)));
      await sequelize.close();
      await onServer(`drop database ${nameOf(suffix)}`);
    }
  }, slow);

  it('give the same data to the last value and moment', () => {
    expect(loads[0]!.digest).toMatch(/^[0-9a-f]{32}$/);
    expect(loads[1]).toEqual(loads[0]);
  });

  it('and a load on another day gives other data', () => {
    expect(loads[2]).not.toEqual(loads[0]);
  });
});

describe('a load that was cut off', () => {
  it('counts as empty and is made whole by the next', { timeout: slow }, async () => {
    const sequelize = await emptyDatabase('cut');
    try {
      expect(await isDatabaseEmpty(sequelize)).toBe(true);
      const stop = (done: number) => {
        if (done === 40) throw new Error('power cut');
      };
      await expect(seedDemo(sequelize, { patients: 3, now, onProgress: stop })).rejects.toThrow('power cut');
      expect(await countOf(sequelize, 'from patients')).toBeGreaterThan(0);
      expect(await isDatabaseEmpty(sequelize)).toBe(true);
      const progress: string[] = [];
      const result = await seedDemo(sequelize, {
        patients: 3,
        now,
        onProgress: (done, total) => progress.push(`${done}/${total}`),
      });
      expect(result).toEqual({ patients: 6 });
      expect(await countOf(sequelize, 'from patients')).toBe(6);
      expect(await isDatabaseEmpty(sequelize)).toBe(false);
      expect(progress.at(-1)).toBe(`${progress.length}/${progress.length}`);
    } finally {
      await sequelize.close();
      await onServer(`drop database ${nameOf('cut')}`);
    }
  });

  it('is told apart from a clinic of one\u2019s own', { timeout: slow }, async () => {
    const sequelize = await emptyDatabase('own');
    try {
      await sequelize.query(`insert into clinics (id, name, time_zone, created_at, updated_at)
        values (gen_random_uuid(), 'Own clinic', 'America/Denver', now(), now())`);
      expect(await isDatabaseEmpty(sequelize)).toBe(false);
    } finally {
      await sequelize.close();
      await onServer(`drop database ${nameOf('own')}`);
    }
  });
});

describe('the demo clinic', () => {
  let sequelize: Sequelize;
  const inMain = `clinic_id = '${alderFalls.id}'`;

  beforeAll(async () => {
    sequelize = await emptyDatabase('full');
    await seedDemo(sequelize, { now });
  }, slow);

  afterAll(async () => {
    await sequelize.close();
    await onServer(`drop database ${nameOf('full')}`);
  });

  it('has sixty adults of 30 to 88 in every diagnosis group and every state of a course', async () => {
    expect(await countOf(sequelize, `from patients where ${inMain}`)).toBe(60);
    const groups = await rowsOf(sequelize, `select distinct diagnosis_group as "group" from patients where ${inMain}`);
    expect(groups.map((row) => (row as { group: string }).group).sort()).toEqual([...diagnosisGroups].sort());
    const states = await rowsOf<{ status: string }>(sequelize, 'select distinct status from enrollments');
    expect(states.map((row) => row.status).sort()).toEqual([...enrollmentStatuses].sort());
    const years = `date_part('year', age('2026-10-14', birth_date))`;
    expect(await countOf(sequelize, `from patients where ${years} not between 30 and 88`)).toBe(0);
    expect(await countOf(sequelize, 'from (select distinct given_name, family_name from patients) names')).toBe(63);
  });

  it('shows the patterns of all kinds and courses that went each way', async () => {
    const patterns = await rowsOf<{ id: string }>(
      sequelize,
      `select distinct pattern ->> 'id' as id from enrollment_summaries where pattern is not null`,
    );
    const ids = patterns.map((row) => row.id);
    expect(ids).toEqual(expect.arrayContaining(['obstruction', 'restriction', 'mixed', 'normal', 'non-specific']));
    const verdicts = await rowsOf<{ verdict: string }>(
      sequelize,
      `select distinct measures -> 'sixMinuteWalkDistance' ->> 'verdict' as verdict from enrollment_summaries
       where measures -> 'sixMinuteWalkDistance' ->> 'verdict' is not null`,
    );
    expect(verdicts.map((row) => row.verdict).sort()).toEqual(['better', 'within-variation', 'worse']);
    const styles = await rowsOf<{ style: string }>(
      sequelize,
      `select distinct bronchodilator || ' ' || entry as style from spirometry_tests`,
    );
    expect(styles.map((row) => row.style)).toEqual(
      expect.arrayContaining(['before maneuvers', 'after maneuvers', 'after best', 'none best', 'unknown best']),
    );
    expect(await countOf(sequelize, 'from maneuvers where not fev1_accepted and reason is not null')).toBeGreaterThan(
      3,
    );
  });

  it('holds the examples of what goes wrong', async () => {
    const flags = await rowsOf<{ status: string; count: number }>(
      sequelize,
      'select status, count(*)::int as count from flags group by status order by status',
    );
    expect(flags).toEqual([
      { status: 'open', count: 2 },
      { status: 'resolved', count: 1 },
    ]);
    expect(await countOf(sequelize, `from measurements where measure = 'phq9' and safety_answer is null`)).toBe(0);
    expect(await countOf(sequelize, `from clinical_revisions`)).toBe(2);
    expect(await countOf(sequelize, `from spirometry_tests where void_reason = 'wrong-patient'`)).toBe(1);
    expect(
      await countOf(sequelize, `from measurements where void_reason = 'duplicate' and source_kind = 'measurement'`),
    ).toBe(1);
    expect(await countOf(sequelize, `from file_entries where kind = 'safety-hold' and released_at is null`)).toBe(2);
    expect(await countOf(sequelize, `from file_entries where kind = 'safety-hold' and released_at is not null`)).toBe(
      1,
    );
    const heights = `(select patient_id from spirometry_tests where height_method = 'measured'
      group by patient_id having max(height_cm) - min(height_cm) = 2) changed`;
    expect(await countOf(sequelize, `from ${heights}`)).toBe(1);
    expect(
      await countOf(
        sequelize,
        `from (select distinct patient_id from spirometry_tests where height_method = 'stated') stated`,
      ),
    ).toBe(1);
    expect(
      await countOf(
        sequelize,
        `from file_entries f join users u on u.id = f.recorded_by where kind = 'oxygen-order'
         and f.details ->> 'outside' = 'false' and not 'pulmonologist' = any (u.roles)`,
      ),
    ).toBe(0);
  });

  it('has summaries equal to what is computed again', async () => {
    const { rebuilt, differed } = await rebuildEnrollmentSummaries(sequelize);
    expect(rebuilt).toBeGreaterThan(50);
    expect(differed).toBe(0);
  });

  it('lets the six demo accounts sign in with the printed password', async () => {
    const emails = ['admin', 'coordinator', 'therapist', 'pulmonologist', 'patient'].map((n) => `${n}@alderfalls.test`);
    for (const email of [...emails, 'coordinator@stonebridge.test']) {
      const user = await User.findOne({ where: { email } });
      expect(await passwordMatches(user?.passwordHash ?? null, demoPassword), email).toBe(true);
    }
    expect(await User.count()).toBe(6);
    // links that were issued on the way open nothing any more
    expect(await countOf(sequelize, 'from account_links where used_at is null')).toBe(0);
  });

  it('keeps the second clinic to itself', async () => {
    expect(await countOf(sequelize, `from patients where clinic_id = '${stonebridge.id}'`)).toBe(3);
    for (const table of ['spirometry_tests', 'measurements', 'file_entries', 'enrollments']) {
      const mixed = `from ${table} t join patients p on p.id = t.patient_id where p.clinic_id <> t.clinic_id`;
      expect(await countOf(sequelize, mixed), table).toBe(0);
    }
    const strangers = `from measurements m join users u on u.id = m.recorded_by where u.clinic_id <> m.clinic_id`;
    expect(await countOf(sequelize, strangers)).toBe(0);
  });

  it('gives the demo patient a course in progress, tests on at least four dates, and progress to show', async () => {
    const [row] = await rowsOf<{ dates: number; status: string; walk: number; cat: number; heading: string }>(
      sequelize,
      `select (select count(distinct (performed_at at time zone 'America/Denver')::date)::int from spirometry_tests t
          where t.patient_id = u.patient_id) as dates, e.status,
        (s.measures -> 'sixMinuteWalkDistance' ->> 'absolute')::float8 as walk,
        (s.measures -> 'cat' ->> 'absolute')::float8 as cat, s.pattern ->> 'heading' as heading
       from users u join enrollments e on e.patient_id = u.patient_id
         join enrollment_summaries s on s.enrollment_id = e.id
       where u.email = 'patient@alderfalls.test'`,
    );
    expect(row).toMatchObject({ status: 'active', heading: 'Obstructive pattern, severe' });
    expect(row!.dates).toBeGreaterThanOrEqual(4);
    expect(row!.walk).toBeGreaterThan(30);
    expect(row!.cat).toBeLessThanOrEqual(-2);
  });

  it('has a trail in the order of its moments, with an event for every entry', async () => {
    const disorder = `from (select at, lag(at) over (order by id) as before from audit_events) trail where at < before`;
    expect(await countOf(sequelize, disorder)).toBe(0);
    const silent = (kind: string, table: string, more = '') =>
      `from ${table} t where not exists (select 1 from audit_events a where a.entity_kind = '${kind}'
        and t.patient_id = any (a.patient_ids) and a.action = '${kind}.create' and a.entity_id = t.id) ${more}`;
    expect(
      await countOf(
        sequelize,
        silent('measurement', 'measurements', `and source_kind = 'measurement' and id = source_id`),
      ),
    ).toBe(0);
    expect(await countOf(sequelize, silent('enrollment', 'enrollments'))).toBe(0);
    // a pair is one command: its event names the second test
    expect(
      await countOf(sequelize, silent('spirometry-test', 'spirometry_tests', `and bronchodilator <> 'before'`)),
    ).toBe(0);
    expect(await countOf(sequelize, silent('file-entry', 'file_entries', `and kind <> 'diagnosis'`))).toBe(0);
    expect(
      await countOf(
        sequelize,
        `from patients p where not exists (select 1 from audit_events a
      where a.action = 'patient.create' and a.entity_id = p.id)`,
      ),
    ).toBe(0);
  });

  it('was written at the moments it tells of, none of them later than yesterday', async () => {
    for (const table of ['patients', 'measurements', 'spirometry_tests', 'file_entries', 'enrollments', 'body_sizes']) {
      const late = `from ${table} where greatest(created_at, updated_at) >= '2026-10-14T06:00:00Z'`;
      expect(await countOf(sequelize, late), table).toBe(0);
    }
    const early = `from measurements where created_at < taken_at or created_at > taken_at + interval '1 year'`;
    expect(await countOf(sequelize, early)).toBe(0);
    const span = await rowsOf<{ days: number }>(
      sequelize,
      `select date_part('day', '2026-10-14T16:12:00Z' - min(created_at))::int as days from patients`,
    );
    expect(span[0]!.days).toBeGreaterThan(300);
    expect(span[0]!.days).toBeLessThan(430);
  });
});
