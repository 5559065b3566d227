import type { HeightMethod } from '@slighthill/shared/contracts/common';
import type { BronchodilatorState } from '@slighthill/shared/contracts/spirometry-test';
import { decodeCursor, pageOf } from '../db/keyset';
import { selectRow, selectRows } from '../db/query';
import type { Actor } from '../policies/actor';
import { entryPeopleColumns, entryPeopleJoins, type EntryPeople } from './entry-people';

export interface ManeuverRow {
  fev1Ml: number;
  fvcMl: number;
  pefLS: number | null;
  fef2575LS: number | null;
  forcedTimeS: number | null;
  fev1Accepted: boolean;
  fvcAccepted: boolean;
  reason: string | null;
}

export interface SpirometryTestRow extends EntryPeople {
  id: string;
  clinicId: string;
  patientId: string;
  visitId: string;
  performedAt: Date;
  performedOn: string;
  heightCm: number;
  heightMethod: HeightMethod;
  weightKg: number | null;
  bronchodilator: BronchodilatorState;
  drug: string | null;
  doseMcg: number | null;
  minutesSinceDose: number | null;
  ownBronchodilatorHoursAgo: number | null;
  entry: 'best' | 'maneuvers';
  fev1Ml: number | null;
  fvcMl: number | null;
  pefLS: number | null;
  fef2575LS: number | null;
  quality: string | null;
  note: string | null;
  maneuvers: ManeuverRow[];
}

/** Tests with their maneuvers in one statement, whatever the number of tests. */
const sql = (where: string) => /* sql */ `
  select e.id, e.clinic_id as "clinicId", e.patient_id as "patientId", e.visit_id as "visitId",
    e.performed_at as "performedAt", to_char(e.performed_at at time zone $timeZone, 'YYYY-MM-DD') as "performedOn",
    e.height_cm::float8 as "heightCm", e.height_method as "heightMethod", e.weight_kg::float8 as "weightKg",
    e.bronchodilator, e.drug, e.dose_mcg::float8 as "doseMcg", e.minutes_since_dose as "minutesSinceDose",
    e.own_bronchodilator_hours_ago::float8 as "ownBronchodilatorHoursAgo", e.entry, e.fev1_ml as "fev1Ml",
    e.fvc_ml as "fvcMl", e.pef_l_s::float8 as "pefLS", e.fef2575_l_s::float8 as "fef2575LS", e.quality, e.note,
    ${entryPeopleColumns},
    coalesce((select json_agg(json_build_object('fev1Ml', m.fev1_ml, 'fvcMl', m.fvc_ml, 'pefLS', m.pef_l_s,
      'fef2575LS', m.fef2575_l_s, 'forcedTimeS', m.forced_time_s, 'fev1Accepted', m.fev1_accepted,
      'fvcAccepted', m.fvc_accepted, 'reason', m.reason) order by m.number)
      from maneuvers m where m.spirometry_test_id = e.id and e.entry = 'maneuvers'), '[]') as maneuvers
  from spirometry_tests e ${entryPeopleJoins}
  where e.clinic_id = $clinicId and ${where}`;

const scope = (actor: Actor) => ({ clinicId: actor.clinicId, timeZone: actor.clinic.timeZone });

export async function findSpirometryTest(actor: Actor, id: string): Promise<SpirometryTestRow | null> {
  return await selectRow<SpirometryTestRow>(sql('e.id = $id'), { ...scope(actor), id });
}

export async function findSpirometryTests(actor: Actor, ids: readonly string[]): Promise<SpirometryTestRow[]> {
  const rows = await selectRows<SpirometryTestRow>(sql('e.id = any ($ids::uuid[])'), { ...scope(actor), ids });
  return ids.flatMap((id) => rows.filter((row) => row.id === id));
}

/** Newest first; a pair stands together through its visit id. */
export async function listSpirometryTests<Item>(
  actor: Actor,
  patientId: string,
  page: { cursor?: string | undefined; limit: number },
  present: (row: SpirometryTestRow) => Item,
) {
  const [at, id] = decodeCursor(page.cursor, ['instant', 'id']) ?? [null, null];
  const rows = await selectRows<SpirometryTestRow>(
    `${sql('e.patient_id = $patientId and ($at::timestamptz is null or (e.performed_at, e.id) < ($at, $id::uuid))')}
     order by e.performed_at desc, e.id desc limit $limit`,
    { ...scope(actor), patientId, at, id, limit: page.limit + 1 },
  );
  return pageOf(rows, page.limit, (row) => [row.performedAt.toISOString(), row.id], present);
}
