import type { Ability } from '@slighthill/shared/permissions';
import type { Actor } from './actor';
import { can } from './policy';

/** What the person may still do to a clinical entry; nothing once it is voided. */
export function entryAbilities(
  actor: Actor,
  ability: Ability,
  row: { clinicId: string; voidedAt: Date | null },
): ('amend' | 'void')[] {
  return row.voidedAt === null && can(actor, ability, row) ? ['amend', 'void'] : [];
}

interface FileEntryLike {
  clinicId: string;
  kind: string;
  details: Record<string, unknown>;
  voidedAt: Date | null;
  releasedAt: Date | null;
}

/**
 * What it takes to change an entry of the file: an oxygen order of this clinic belongs to pulmonologists, and a safety
 * hold is never amended or voided away by anyone who could not release it.
 */
export function fileChangeAbility(kind: string, details: Record<string, unknown>): Ability {
  if (kind === 'safety-hold') return 'holds:release';
  if (kind === 'oxygen-order' && details.outside !== true) return 'oxygen:order';
  return 'file:write';
}

export function fileEntryAbilities(actor: Actor, row: FileEntryLike): ('amend' | 'void' | 'release')[] {
  if (row.voidedAt !== null || row.releasedAt !== null) return [];
  const changes = entryAbilities(actor, fileChangeAbility(row.kind, row.details), row);
  const mayRelease = row.kind === 'safety-hold' && can(actor, 'holds:release', row);
  return mayRelease ? [...changes, 'release'] : changes;
}
