import type { Revision } from '@slighthill/shared/contracts/common';
import { selectRows } from '../db/query';
import type { EntityKind } from '../models/clinical-revision';
import type { Actor } from '../policies/actor';

interface Row {
  version: number;
  changedAt: Date;
  changedById: string;
  changedByName: string;
  reason: string;
  before: Record<string, unknown>;
}

/** What an entry said before each change, newest change first. */
export async function historyOf(actor: Actor, kind: EntityKind, id: string): Promise<Revision[]> {
  const rows = await selectRows<Row>(
    `select h.version, h.changed_at as "changedAt", h.changed_by as "changedById", u.display_name as "changedByName",
       h.reason, h.snapshot as before
     from clinical_revisions h join users u on u.id = h.changed_by
     where h.entity_kind = $kind and h.entity_id = $id and h.clinic_id = $clinicId
     order by h.version desc`,
    { kind, id, clinicId: actor.clinicId },
  );
  return rows.map((row) => ({
    version: row.version,
    changedAt: row.changedAt.toISOString(),
    changedBy: { id: row.changedById, displayName: row.changedByName },
    reason: row.reason,
    before: row.before,
  }));
}
