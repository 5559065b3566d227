import type { Voided } from '@slighthill/shared/contracts/common';
import type { EntryPeople } from '../queries/entry-people';

/** Who recorded an entry and when, its version, and who voided it and why. */
export function presentPeople(row: EntryPeople) {
  return {
    recordedBy: { id: row.recordedById, displayName: row.recordedByName },
    recordedAt: row.recordedAt.toISOString(),
    version: row.version,
    voided: presentVoided(row),
  };
}

function presentVoided(row: EntryPeople): Voided {
  if (row.voidedAt === null) return null;
  return {
    at: row.voidedAt.toISOString(),
    by: { id: row.voidedById!, displayName: row.voidedByName! },
    reason: row.voidReason!,
    text: row.voidText,
  };
}
