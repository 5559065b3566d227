import { selectRow } from '../db/query';
import type { Actor } from '../policies/actor';
import { visibleTo } from '../policies/policy';
import type { FlagRow } from './patient-detail';

/** A flag with the newest occurrence that stands, or the newest at all once every one is withdrawn. */
export async function findFlag(actor: Actor, id: string): Promise<FlagRow | null> {
  return await selectRow<FlagRow>(
    `select f.id, f.rule, f.raised_at as "raisedAt", f.version, o.detail, o.source_kind as "sourceKind",
       o.source_id as "sourceId"
     from flags f join lateral (select * from flag_occurrences oc where oc.flag_id = f.id
       order by (oc.withdrawn_at is null) desc, oc.occurred_at desc, oc.id limit 1) o on true
     where f.id = $id and f.clinic_id = $clinicId`,
    { id, ...visibleTo(actor) },
  );
}
