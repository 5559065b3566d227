import type { TestKind } from '@slighthill/shared/contracts/measurement';
import { decodeCursor, pageOf } from '../db/keyset';
import { selectRows } from '../db/query';
import type { Actor } from '../policies/actor';
import { visibleTo } from '../policies/policy';

export interface TestRow {
  kind: TestKind;
  id: string;
  at: Date;
  on: string;
  measure: string | null;
  state: string | null;
  /** By measure, in storage units. */
  values: Record<string, number | null>;
  heightCm: number | null;
  recordedByName: string;
  amended: boolean;
  voided: boolean;
}

/** Each kind reads at most one page from its own index; the union sorts three pages. */
const branch = (select: string, from: string, at: string, own: string) => /* sql */ `
  (select ${select}, e.id, ${at} as at, e.recorded_by, e.version > 1 as amended, e.voided_at is not null as voided
   from ${from} e
   where e.patient_id = $patientId and e.clinic_id = $clinicId ${own}
     and ($at::timestamptz is null or (${at}, e.id) < ($at, $id::uuid))
   order by ${at} desc, e.id desc limit $limit)`;

const sql = /* sql */ `
  with found as (
    ${branch(
      `'spirometry-test' as kind, null as measure, e.bronchodilator as state, json_build_object('fev1', e.fev1_ml,
        'fvc', e.fvc_ml, 'pef', e.pef_l_s) as "values", e.height_cm::float8 as "heightCm"`,
      'spirometry_tests',
      'e.performed_at',
      '',
    )}
    union all
    ${branch(
      `'measurement' as kind, e.measure, e.state, json_build_object(e.measure, e.value) as "values",
        e.height_cm::float8 as "heightCm"`,
      'measurements',
      'e.taken_at',
      `and e.source_kind = 'measurement' and e.source_id = e.id`,
    )}
    union all
    ${branch(
      `'body-size' as kind, null as measure, null as state, json_build_object('weight', e.weight_kg) as "values",
        e.height_cm::float8 as "heightCm"`,
      'body_sizes',
      'e.taken_at',
      `and e.source_kind = 'body-size'`,
    )}
  )
  select f.kind, f.id, f.at, to_char(f.at at time zone $timeZone, 'YYYY-MM-DD') as "on", f.measure, f.state, f.values,
    f."heightCm", u.display_name as "recordedByName", f.amended, f.voided
  from found f join users u on u.id = f.recorded_by
  order by f.at desc, f.id desc limit $limit`;

/** Spirometry tests, single results and body sizes of a patient in one list, newest first, voided ones included. */
export async function listTests<Item>(
  actor: Actor,
  patientId: string,
  page: { cursor?: string | undefined; limit: number },
  present: (row: TestRow) => Item,
) {
  const [at, id] = decodeCursor(page.cursor, ['instant', 'id']) ?? [null, null];
  const rows = await selectRows<TestRow>(sql, {
    ...visibleTo(actor),
    timeZone: actor.clinic.timeZone,
    patientId,
    at,
    id,
    limit: page.limit + 1,
  });
  return pageOf(rows, page.limit, (row) => [row.at.toISOString(), row.id], present);
}
