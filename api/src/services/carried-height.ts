import { selectRow, selectRows } from '../db/query';
import type { HeightMethod } from '@slighthill/shared/contracts/common';

export interface Height {
  heightCm: number;
  heightMethod: HeightMethod;
  heightCarried: boolean;
}

const dayOf = (instant: string) => `(${instant} at time zone $timeZone)::date`;

/** The newest measured height up to that day and at most 12 months old, that the source itself did not bring. */
const newestSql = (at: string, sourceId: string) => /* sql */ `
  select b.height_cm::float8 as "heightCm", b.height_method as "heightMethod"
  from body_sizes b
  where b.patient_id = $patientId and b.voided_at is null and b.height_cm is not null and b.height_method = 'measured'
    and ${dayOf('b.taken_at')} <= ${dayOf(at)} and ${dayOf('b.taken_at')} >= ${dayOf(at)} - interval '12 months'
    and b.source_id is distinct from ${sourceId}
  order by b.taken_at desc, b.created_at desc, b.id desc limit 1`;

interface HeightReader {
  actor: { clinic: { timeZone: string } };
}

type Found = Omit<Height, 'heightCarried'>;

/** The height a result recorded without one uses, marked as carried, or null. */
export async function carriedHeight(
  context: HeightReader,
  patientId: string,
  at: Date,
  exceptSourceId?: string,
): Promise<Height | null> {
  const row = await selectRow<Found>(newestSql('$at::timestamptz', '$exceptSourceId::uuid'), {
    patientId,
    at,
    exceptSourceId,
    timeZone: context.actor.clinic.timeZone,
  });
  return row ? { ...row, heightCarried: true } : null;
}

/** The same for every current result of a patient that has no height of its own, in one statement, by source. */
export async function carriedHeightsOf(context: HeightReader, patientId: string): Promise<Map<string, Height>> {
  const rows = await selectRows<Found & { sourceId: string }>(
    `select m.source_id as "sourceId", h.*
     from (select distinct source_id, taken_at from measurements
       where patient_id = $patientId and voided_at is null and source_kind in ('measurement', 'body-size')
         and (height_carried or height_cm is null)) m
     cross join lateral (${newestSql('m.taken_at', 'm.source_id')}) h`,
    { patientId, timeZone: context.actor.clinic.timeZone },
  );
  return new Map(rows.map(({ sourceId, ...height }) => [sourceId, { ...height, heightCarried: true }]));
}
