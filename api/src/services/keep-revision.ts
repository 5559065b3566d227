import { randomUUID } from 'node:crypto';
import { requireTransaction } from '../db/in-transaction';
import { invalidInput } from '../errors/app-error';
import { ClinicalRevision, type EntityKind } from '../models/clinical-revision';
import type { CommandContext } from './command-context';

interface Revised {
  id: string;
  clinicId: string;
  patientId: string;
  version: number;
}

/** Keeps what an entry said before a change, with who changed it, when and why. */
export async function keepRevision(
  context: CommandContext,
  kind: EntityKind,
  row: Revised,
  snapshot: Record<string, unknown>,
  reason: string,
): Promise<void> {
  requireTransaction();
  await ClinicalRevision.create({
    id: randomUUID(),
    clinicId: row.clinicId,
    patientId: row.patientId,
    entityKind: kind,
    entityId: row.id,
    version: row.version,
    snapshot,
    reason,
    changedBy: context.actor.userId,
    changedAt: context.clock.now(),
  });
}

/** An amendment names what it changes: a reason alone would only fill the history. */
export function requireChanges(changes: object): void {
  if (Object.values(changes).some((value) => value !== undefined)) return;
  throw invalidInput({ path: 'reason', message: 'Nothing was changed. Say what should be different' });
}
