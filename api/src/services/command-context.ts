import type { AuditTrail } from '../audit/audit-trail';
import { inTransaction } from '../db/in-transaction';
import type { Actor } from '../policies/actor';

export interface Clock {
  now(): Date;
}

/** What a command needs to know besides its input: who, when, and where to write it down. */
export interface CommandContext {
  actor: Actor;
  clock: Clock;
  audit: AuditTrail;
}

const tries = 3;

/**
 * One transaction a command; its audit event is part of it. When the database gives up on it because another
 * transaction stood in the way, it is run again from the start.
 */
export async function runCommand<T>(context: CommandContext, work: () => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await inTransaction(async () => {
        const result = await work();
        if (context.audit.isDue) await context.audit.write();
        return result;
      });
    } catch (error) {
      context.audit.forgetWrite();
      if (attempt === tries || !isConflict(error)) throw error;
    }
  }
}

/** Deadlock detected, or not serializable: nothing was kept, and another try may well succeed. */
function isConflict(error: unknown): boolean {
  const { parent, code } = error as { parent?: { code?: unknown }; code?: unknown };
  return ['40P01', '40001'].includes(String(parent?.code ?? code));
}
