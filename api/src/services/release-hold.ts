import { AppError } from '../errors/app-error';
import { FileEntry } from '../models/file-entry';
import { runCommand, type CommandContext } from './command-context';
import { lockEntryForChange } from './lock-for-change';

/** Releases a safety hold with a reason; only a pulmonologist may, which the policy has checked. */
export async function releaseHold(context: CommandContext, id: string, version: number, reason: string): Promise<void> {
  await runCommand(context, async () => {
    const row = await lockEntryForChange(context, FileEntry, id, version);
    context.audit.showsPatients(row.patientId);
    context.audit.about('file-entry', row.id);
    if (row.kind !== 'safety-hold') throw new AppError('wrong-state', 'Only a safety hold can be released.');
    if (row.releasedAt !== null) throw new AppError('wrong-state', 'This hold was released already.');
    await row.update({
      releasedAt: context.clock.now(),
      releasedBy: context.actor.userId,
      releaseReason: reason,
      version: row.version + 1,
    });
  });
}
