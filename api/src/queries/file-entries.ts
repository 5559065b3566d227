import type { FileEntryKind } from '@slighthill/shared/contracts/file-entry';
import { decodeCursor, pageOf } from '../db/keyset';
import { selectRow, selectRows } from '../db/query';
import type { Actor } from '../policies/actor';
import { entryPeopleColumns, entryPeopleJoins, type EntryPeople } from './entry-people';

export interface FileEntryRow extends EntryPeople {
  id: string;
  clinicId: string;
  patientId: string;
  kind: FileEntryKind;
  onDate: string;
  details: Record<string, unknown>;
  note: string | null;
  releasedAt: Date | null;
  releasedById: string | null;
  releasedByName: string | null;
  releaseReason: string | null;
}

const sql = (where: string) => /* sql */ `
  select e.id, e.clinic_id as "clinicId", e.patient_id as "patientId", e.kind, e.on_date::text as "onDate", e.details,
    e.note, e.released_at as "releasedAt", e.released_by as "releasedById", l.display_name as "releasedByName",
    e.release_reason as "releaseReason", ${entryPeopleColumns}
  from file_entries e ${entryPeopleJoins}
  left join users l on l.id = e.released_by
  where e.clinic_id = $clinicId and ${where}`;

export async function findFileEntry(actor: Actor, id: string): Promise<FileEntryRow | null> {
  return await selectRow<FileEntryRow>(sql('e.id = $id'), { clinicId: actor.clinicId, id });
}

export async function listFileEntries<Item>(
  actor: Actor,
  patientId: string,
  page: { cursor?: string | undefined; limit: number; kind?: FileEntryKind | undefined },
  present: (row: FileEntryRow) => Item,
) {
  const [on, id] = decodeCursor(page.cursor, ['date', 'id']) ?? [null, null];
  const rows = await selectRows<FileEntryRow>(
    `${sql(`e.patient_id = $patientId and ($kind::text is null or e.kind = $kind)
       and ($on::date is null or (e.on_date, e.id) < ($on::date, $id::uuid))`)}
     order by e.on_date desc, e.id desc limit $limit`,
    { clinicId: actor.clinicId, patientId, kind: page.kind, on, id, limit: page.limit + 1 },
  );
  return pageOf(rows, page.limit, (row) => [row.onDate, row.id], present);
}
