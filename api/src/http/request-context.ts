import type { Ability } from '@slighthill/shared/permissions';
import type { AuditTrail } from '../audit/audit-trail';
import { AppError, notFound } from '../errors/app-error';
import type { Actor } from '../policies/actor';
import { rolesMay } from '../policies/matrix';
import { can, isVisible, type Guarded } from '../policies/policy';
import type { Clock, CommandContext } from '../services/command-context';

/** What a handler of a signed-in route works with. Services take it as their command context. */
export class RequestContext implements CommandContext {
  readonly actor: Actor;
  readonly clock: Clock;
  readonly audit: AuditTrail;
  /** Set by `authorizeRow`; a route about one row that answers without it is a bug and fails. */
  rowAuthorized = false;

  constructor(actor: Actor, clock: Clock, audit: AuditTrail) {
    this.actor = actor;
    this.clock = clock;
    this.audit = audit;
  }

  authorize(ability: Ability): void {
    if (!rolesMay(this.actor.roles, ability)) throw forbidden();
  }

  /** Not there or not visible: 404. Visible, but the ability is missing: 403. */
  authorizeRow<Row extends Guarded>(ability: Ability, row: Row | null, what: string): Row {
    if (!row || !isVisible(this.actor, row)) throw notFound(what);
    this.rowAuthorized = true;
    if (!can(this.actor, ability, row)) throw forbidden();
    return row;
  }

  /** For routes whose rows are the actor's own by construction (drafts). */
  authorizeOwn(ability: Ability): void {
    this.authorize(ability);
    this.rowAuthorized = true;
  }
}

export const forbidden = () => new AppError('forbidden', 'Your role does not include this. Ask your administrator.');
