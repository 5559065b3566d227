import { bodySizeCreate, measurementCreate } from '@slighthill/shared/contracts/measurement';
import { fileEntryCreate } from '@slighthill/shared/contracts/file-entry';
import { spirometryTestCreate } from '@slighthill/shared/contracts/spirometry-test';
import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditTrail } from '../audit/audit-trail';
import { execute, selectRow, selectRows } from '../db/query';
import { Patient } from '../models/patient';
import type { Actor } from '../policies/actor';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { addEnrollment, addPatient, addSpirometry, fileBody } from '../testing/factories/scene';
import { startTestServer, type TestServer } from '../testing/server';
import { amendMeasurement } from './amend-measurement';
import { amendSpirometryTest } from './amend-spirometry-test';
import type { CommandContext } from './command-context';
import { rebuildEnrollmentSummaries } from './rebuild-enrollment-summaries';
import { recordBodySize } from './record-body-size';
import { recordFileEntry } from './record-file-entry';
import { recordMeasurement } from './record-measurement';
import { recordSpirometryTest } from './record-spirometry-test';
import { updateEnrollment } from './update-enrollment';
import { voidEntry } from './void-entry';

let server: TestServer;
let own: TestClinic;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
});
afterAll(() => server.close());

function contextOf(): CommandContext {
  const { clinic, users } = own;
  const actor: Actor = {
    userId: users.pulmonologist.id,
    displayName: users.pulmonologist.displayName,
    roles: ['coordinator', 'pulmonologist'],
    patientId: null,
    clinicId: clinic.id,
    clinic,
  };
  return { actor, clock: server.clock, audit: new AuditTrail(actor, 'test', null, () => server.clock.now()) };
}

const day = fc.integer({ min: 0, max: 500 });
const dayToInstant = (n: number) => new Date(Date.UTC(2025, 0, 2, 15) + n * 86_400_000).toISOString();
const liters = (min: number, max: number) => fc.integer({ min, max }).map((ml) => ml / 1000);
const blow = fc
  .tuple(liters(500, 2500), liters(0, 2500))
  .map(([fev1, more]) => ({ fev1, fvc: (fev1 * 1000 + more * 1000) / 1000 }));
const state = fc.constantFrom('before', 'after', 'none', 'unknown');
const pick = fc.nat(1000);

const step = fc.oneof(
  {
    weight: 4,
    arbitrary: fc.record({
      do: fc.constant('blow' as const),
      day,
      best: blow,
      state,
      heightCm: fc.integer({ min: 150, max: 190 }),
    }),
  },
  {
    weight: 3,
    arbitrary: fc.record({ do: fc.constant('walk' as const), day, value: fc.integer({ min: 100, max: 600 }) }),
  },
  {
    weight: 2,
    arbitrary: fc.record({
      do: fc.constant('volume' as const),
      day,
      measure: fc.constantFrom('tlc', 'rv'),
      value: liters(2000, 7000),
    }),
  },
  {
    weight: 2,
    arbitrary: fc.record({ do: fc.constant('height' as const), day, heightCm: fc.integer({ min: 150, max: 190 }) }),
  },
  {
    weight: 1,
    arbitrary: fc.record({ do: fc.constant('file' as const), day, group: fc.constantFrom('copd', 'ild', 'asthma') }),
  },
  { weight: 2, arbitrary: fc.record({ do: fc.constant('amend-blow' as const), pick, best: blow, state }) },
  { weight: 2, arbitrary: fc.record({ do: fc.constant('amend-walk' as const), pick, day }) },
  { weight: 3, arbitrary: fc.record({ do: fc.constant('void' as const), pick }) },
  { weight: 1, arbitrary: fc.record({ do: fc.constant('move' as const), day }) },
);
type Step = typeof step extends fc.Arbitrary<infer T> ? T : never;

interface Row {
  id: string;
  version: number;
}
const current = (table: string, patientId: string, more = '') =>
  selectRows<Row>(
    `select id, version from ${table} where patient_id = $patientId and voided_at is null ${more} order by id`,
    {
      patientId,
    },
  );
const entered = `and source_kind = 'measurement' and source_id = id`;
const chosen = <T>(rows: T[], at: number): T | undefined => rows[at % Math.max(rows.length, 1)];

async function take(action: Step, patientId: string): Promise<void> {
  const context = contextOf();
  const patient = (await Patient.findByPk(patientId))!;
  const reason = { reason: 'Typed wrong' };
  switch (action.do) {
    case 'blow': {
      const { best, heightCm, state: bronchodilator } = action;
      const body = { performedAt: dayToInstant(action.day), heightCm, bronchodilator, best };
      await recordSpirometryTest(context, patient, spirometryTestCreate.parse(body));
      return;
    }
    case 'walk': {
      const body = { measure: 'sixMinuteWalkDistance', takenAt: dayToInstant(action.day), value: action.value };
      await recordMeasurement(context, patient, measurementCreate.parse(body));
      return;
    }
    case 'volume': {
      const { measure, value } = action;
      const conditions = { method: 'plethysmography' };
      await recordMeasurement(
        context,
        patient,
        measurementCreate.parse({ measure, value, takenAt: dayToInstant(action.day), conditions }),
      );
      return;
    }
    case 'height':
      await recordBodySize(
        context,
        patient,
        bodySizeCreate.parse({ takenAt: dayToInstant(action.day), heightCm: action.heightCm, weightKg: 80 }),
      );
      return;
    case 'file': {
      const on = dayToInstant(action.day).slice(0, 10);
      await recordFileEntry(
        context,
        patient,
        fileEntryCreate.parse(fileBody('diagnosis', { diagnosisGroup: action.group, confirmedBy: 'x' }, { on })),
      );
      return;
    }
    case 'amend-blow': {
      const row = chosen(await current('spirometry_tests', patientId), action.pick);
      const best = { ...action.best, pef: null, fef2575: null };
      if (row)
        await amendSpirometryTest(context, row.id, {
          version: row.version,
          ...reason,
          best,
          bronchodilator: action.state,
        });
      return;
    }
    case 'amend-walk': {
      const row = chosen(await current('measurements', patientId, entered), action.pick);
      if (row)
        await amendMeasurement(context, row.id, { version: row.version, ...reason, takenAt: dayToInstant(action.day) });
      return;
    }
    case 'void': {
      const kinds = [
        ...(await current('spirometry_tests', patientId)).map((row) => ['spirometry-test', row] as const),
        ...(await current('measurements', patientId, entered)).map((row) => ['measurement', row] as const),
        ...(await current('body_sizes', patientId, `and source_kind = 'body-size'`)).map(
          (row) => ['body-size', row] as const,
        ),
        ...(await current('file_entries', patientId)).map((row) => ['file-entry', row] as const),
      ];
      const found = chosen(kinds, action.pick);
      if (found)
        await voidEntry(context, found[0], found[1].id, { version: found[1].version, reason: 'duplicate', text: null });
      return;
    }
    case 'move': {
      const [row] = await selectRows<Row>(
        `select id, version from enrollments where patient_id = $patientId and ended_on is null`,
        { patientId },
      );
      await updateEnrollment(context, row!.id, {
        version: row!.version,
        startOn: dayToInstant(action.day).slice(0, 10),
      });
    }
  }
}

/** The summary as computed again for one patient, beside what the commands had left. */
const storedSql = `select json_agg(json_build_array(pattern, measures, last_test_on) order by enrollment_id)::text as text
  from enrollment_summaries where patient_id = $patientId`;

describe('the enrollment summaries', () => {
  it('after any sequence of recording, amending, voiding and moving equal a computation from the sources', async () => {
    // rows of other files in this database may lag on purpose; brought in line first
    await rebuildEnrollmentSummaries(server.sequelize);
    const seed = 20260615;
    const runs = fc.sample(fc.array(step, { minLength: 3, maxLength: 14 }), { seed, numRuns: 20 });
    const left = new Map<string, { steps: Step[]; summary: unknown }>();
    for (const steps of runs) {
      const patientId = await addPatient(own);
      await addEnrollment(own, patientId, { startOn: '2025-06-02' });
      for (const action of steps) await take(action, patientId);
      left.set(patientId, { steps, summary: await selectRow(storedSql, { patientId }) });
    }
    const { differed } = await rebuildEnrollmentSummaries(server.sequelize);
    for (const [patientId, { steps, summary }] of left)
      expect({ seed, steps, summary: await selectRow(storedSql, { patientId }) }).toEqual({ seed, steps, summary });
    expect(differed).toBe(0);
    const withPattern = [...left.values()].filter(({ summary }) =>
      /"id"/.test(JSON.stringify(summary).replace(/\\/g, '')),
    );
    expect(withPattern.length).toBeGreaterThan(runs.length / 3);
  }, 120_000);

  it('are put right, and counted, when one was tampered with', async () => {
    const patientId = await addPatient(own);
    await addEnrollment(own, patientId);
    await addSpirometry(own, patientId);
    const before = await selectRow(storedSql, { patientId });
    await execute(`update enrollment_summaries set last_test_on = '2020-01-01' where patient_id = $patientId`, {
      patientId,
    });
    expect((await rebuildEnrollmentSummaries(server.sequelize)).differed).toBe(1);
    expect(await selectRow(storedSql, { patientId })).toEqual(before);
    expect((await rebuildEnrollmentSummaries(server.sequelize)).differed).toBe(0);
  });
});
