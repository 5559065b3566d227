import type { FileEntry } from '@slighthill/shared/contracts/file-entry';
import type { FileEntryRow } from '../queries/file-entries';
import { presentPeople } from './entry-people';

export function presentFileEntry(row: FileEntryRow): FileEntry {
  return {
    id: row.id,
    patientId: row.patientId,
    kind: row.kind,
    on: row.onDate,
    details: row.details,
    note: row.note,
    ...presentPeople(row),
    released:
      row.releasedAt === null
        ? null
        : {
            at: row.releasedAt.toISOString(),
            by: { id: row.releasedById!, displayName: row.releasedByName! },
            reason: row.releaseReason!,
          },
  };
}
