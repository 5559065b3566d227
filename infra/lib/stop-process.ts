import { isStillRunning } from './process-identity';
import type { ProcessMark } from './process-identity';
import { waitUntil } from './wait';

/** Asks one of our own processes to end, and ends it if it does not within the time. */
export async function stopProcess(mark: ProcessMark, graceMs = 10_000): Promise<void> {
  if (!isStillRunning(mark)) return;
  process.kill(mark.pid, 'SIGTERM');
  if (await waitUntil(() => !isStillRunning(mark), { timeoutMs: graceMs })) return;
  if (isStillRunning(mark)) process.kill(mark.pid, 'SIGKILL');
  await waitUntil(() => !isStillRunning(mark), { timeoutMs: 5_000 });
}
