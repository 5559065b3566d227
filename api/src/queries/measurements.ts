import type { HeightMethod } from '@slighthill/shared/contracts/common';
import type { SafetyAnswer } from '@slighthill/shared/contracts/measurement';
import { decodeCursor, pageOf } from '../db/keyset';
import { selectRow, selectRows } from '../db/query';
import type { MeasurementSourceKind } from '../models/measurement';
import type { Actor } from '../policies/actor';
import { entryPeopleColumns, entryPeopleJoins, type EntryPeople } from './entry-people';

export interface MeasurementRow extends EntryPeople {
  id: string;
  clinicId: string;
  patientId: string;
  measure: string;
  takenAt: Date;
  takenOn: string;
  /** In the storage unit of the measure. */
  value: number;
  conditions: Record<string, number | boolean | string>;
  heightCm: number | null;
  heightMethod: HeightMethod | null;
  heightCarried: boolean;
  weightKg: number | null;
  safetyAnswer: SafetyAnswer | null;
  note: string | null;
  sourceKind: MeasurementSourceKind;
  sourceId: string;
}

const sql = (where: string) => /* sql */ `
  select e.id, e.clinic_id as "clinicId", e.patient_id as "patientId", e.measure, e.taken_at as "takenAt",
    to_char(e.taken_at at time zone $timeZone, 'YYYY-MM-DD') as "takenOn", e.value, e.conditions,
    e.height_cm::float8 as "heightCm", e.height_method as "heightMethod", e.height_carried as "heightCarried",
    e.weight_kg::float8 as "weightKg", e.safety_answer as "safetyAnswer", e.note, e.source_kind as "sourceKind",
    e.source_id as "sourceId", ${entryPeopleColumns}
  from measurements e ${entryPeopleJoins}
  where e.clinic_id = $clinicId and ${where}`;

const scope = (actor: Actor) => ({ clinicId: actor.clinicId, timeZone: actor.clinic.timeZone });

export async function findMeasurement(actor: Actor, id: string): Promise<MeasurementRow | null> {
  return await selectRow<MeasurementRow>(sql('e.id = $id'), { ...scope(actor), id });
}

/** Results entered as one number, newest first, voided ones included. */
export async function listMeasurements<Item>(
  actor: Actor,
  patientId: string,
  page: { cursor?: string | undefined; limit: number; measure?: string | undefined },
  present: (row: MeasurementRow) => Item,
) {
  const [at, id] = decodeCursor(page.cursor, ['instant', 'id']) ?? [null, null];
  const rows = await selectRows<MeasurementRow>(
    `${sql(`e.patient_id = $patientId and e.source_kind = 'measurement' and e.source_id = e.id
       and ($measure::text is null or e.measure = $measure)
       and ($at::timestamptz is null or (e.taken_at, e.id) < ($at, $id::uuid))`)}
     order by e.taken_at desc, e.id desc limit $limit`,
    { ...scope(actor), patientId, measure: page.measure, at, id, limit: page.limit + 1 },
  );
  return pageOf(rows, page.limit, (row) => [row.takenAt.toISOString(), row.id], present);
}
