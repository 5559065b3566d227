import type { HeightMethod } from '@slighthill/shared/contracts/common';
import { decodeCursor, pageOf } from '../db/keyset';
import { selectRow, selectRows } from '../db/query';
import type { Actor } from '../policies/actor';
import { entryPeopleColumns, entryPeopleJoins, type EntryPeople } from './entry-people';

export interface BodySizeRow extends EntryPeople {
  id: string;
  clinicId: string;
  patientId: string;
  takenAt: Date;
  takenOn: string;
  heightCm: number | null;
  heightMethod: HeightMethod | null;
  weightKg: number | null;
  bmi: number | null;
  note: string | null;
  sourceKind: 'body-size' | 'spirometry-test' | 'measurement';
}

const sql = (where: string) => /* sql */ `
  select e.id, e.clinic_id as "clinicId", e.patient_id as "patientId", e.taken_at as "takenAt",
    to_char(e.taken_at at time zone $timeZone, 'YYYY-MM-DD') as "takenOn", e.height_cm::float8 as "heightCm",
    e.height_method as "heightMethod", e.weight_kg::float8 as "weightKg", e.note, e.source_kind as "sourceKind",
    (select m.value from measurements m where m.source_kind = e.source_kind and m.source_id = e.source_id
      and m.measure = 'bmi' and m.voided_at is null) as bmi,
    ${entryPeopleColumns}
  from body_sizes e ${entryPeopleJoins}
  where e.clinic_id = $clinicId and ${where}`;

const scope = (actor: Actor) => ({ clinicId: actor.clinicId, timeZone: actor.clinic.timeZone });

export async function findBodySize(actor: Actor, id: string): Promise<BodySizeRow | null> {
  return await selectRow<BodySizeRow>(sql('e.id = $id'), { ...scope(actor), id });
}

/** Every height and weight, with those that came with a test, newest first. */
export async function listBodySizes<Item>(
  actor: Actor,
  patientId: string,
  page: { cursor?: string | undefined; limit: number },
  present: (row: BodySizeRow) => Item,
) {
  const [at, id] = decodeCursor(page.cursor, ['instant', 'id']) ?? [null, null];
  const rows = await selectRows<BodySizeRow>(
    `${sql('e.patient_id = $patientId and ($at::timestamptz is null or (e.taken_at, e.id) < ($at, $id::uuid))')}
     order by e.taken_at desc, e.id desc limit $limit`,
    { ...scope(actor), patientId, at, id, limit: page.limit + 1 },
  );
  return pageOf(rows, page.limit, (row) => [row.takenAt.toISOString(), row.id], present);
}
