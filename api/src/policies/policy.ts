import type { Ability } from '@slighthill/shared/permissions';
import type { Actor } from './actor';
import { rolesMay } from './matrix';

/** What a row must say of itself for a policy to judge it. `ownerId` narrows it to one person. */
export interface Guarded {
  clinicId: string;
  ownerId?: string;
}

/** True when the person's roles give the ability and the row belongs to the person's clinic (and person, if owned). */
export function can(actor: Actor, ability: Ability, row: Guarded): boolean {
  return rolesMay(actor.roles, ability) && isVisible(actor, row);
}

/** True when the row may be known to exist at all; otherwise the answer is 404. */
export function isVisible(actor: Actor, row: Guarded): boolean {
  return row.clinicId === actor.clinicId && (row.ownerId === undefined || row.ownerId === actor.userId);
}

/**
 * The filter that keeps every list and look-up inside the person's clinic. Rows found with it are exactly the rows
 * for which `isVisible` holds.
 */
export function visibleTo(actor: Actor): { clinicId: string } {
  return { clinicId: actor.clinicId };
}
