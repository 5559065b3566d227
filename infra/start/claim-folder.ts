import { dataDir } from '../lib/project-paths';
import { isStillRunning } from '../lib/process-identity';
import { takeRunningLock, whoIsRunning } from '../lib/running-lock';
import type { RunningLock } from '../lib/running-lock';
import { stopProcess } from '../lib/stop-process';
import { UserError } from '../lib/user-error';

/** Makes this command the one that runs the product from this folder, and ends what a killed one left running. */
export async function claimFolder(command: string): Promise<RunningLock> {
  const lock = takeRunningLock(dataDir, command);
  if (!lock) {
    const other = whoIsRunning(dataDir);
    const where = other?.port ? ` at http://127.0.0.1:${other.port}` : '';
    throw new UserError(
      `Slighthill already runs from this folder${where} (npm run ${other?.command ?? 'start'}, process ${other?.owner.pid ?? 'unknown'}). Stop it first with Ctrl-C.`,
    );
  }
  const api = lock.leftBehind?.api;
  if (api && isStillRunning(api)) {
    console.log('  An API of an earlier start is still running; stopping it.');
    await stopProcess(api);
  }
  return lock;
}
