import { AppError } from '../errors/app-error';
import { Flag } from '../models/flag';
import { runCommand, type CommandContext } from './command-context';
import { lockForChange } from './lock-for-change';

/** Closes a flag with a note saying what was done. The note is kept with who and when. */
export async function resolveFlag(context: CommandContext, id: string, version: number, note: string): Promise<Flag> {
  return await runCommand(context, async () => {
    const flag = await lockForChange(context, Flag, id, version);
    if (flag.status !== 'open') throw new AppError('wrong-state', 'This flag was closed already.');
    context.audit.showsPatients(flag.patientId);
    context.audit.about('flag', flag.id);
    return await flag.update({
      status: 'resolved',
      resolvedAt: context.clock.now(),
      resolvedBy: context.actor.userId,
      resolution: note,
      version: flag.version + 1,
    });
  });
}
