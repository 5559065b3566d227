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

/** One transaction a command; its audit event is part of it. */
export async function runCommand<T>(context: CommandContext, work: () => Promise<T>): Promise<T> {
  try {
    return await inTransaction(async () => {
      const result = await work();
      if (context.audit.isDue) await context.audit.write();
      return result;
    });
  } catch (error) {
    context.audit.forgetWrite();
    throw error;
  }
}
