import { existsSync, readdirSync, readFileSync, readlinkSync, realpathSync, rmSync } from 'node:fs';
import path from 'node:path';
import { processIdentity } from '../lib/process-identity';
import { UserError } from '../lib/user-error';
import { waitUntil } from '../lib/wait';

const hasProc = existsSync('/proc/self/cwd');

function workingDir(pid: string | number): string | null {
  try {
    return readlinkSync(`/proc/${pid}/cwd`);
  } catch {
    return null;
  }
}

interface PostmasterFile {
  pid: number;
  port: number | null;
}

function readPostmasterFile(clusterDir: string): PostmasterFile | null {
  try {
    const lines = readFileSync(path.join(clusterDir, 'postmaster.pid'), 'utf8').split('\n');
    const port = Number(lines[3]);
    return { pid: Number(lines[0]), port: Number.isInteger(port) && port > 0 ? port : null };
  } catch {
    return null;
  }
}

/** A server works inside its cluster's folder; a process that got the number of a dead server does not. */
function runsIn(clusterDir: string, pid: number): boolean {
  if (processIdentity(pid) === null) return false;
  return !hasProc || workingDir(pid) === realpathSync(clusterDir);
}

/** The server of this cluster that runs now: its process and port. */
export function runningServer(clusterDir: string): PostmasterFile | null {
  const file = readPostmasterFile(clusterDir);
  return file && runsIn(clusterDir, file.pid) ? file : null;
}

/** Does any process, the server or one of its workers, still work in the cluster? */
function isInUse(clusterDir: string): boolean {
  if (!hasProc) return false;
  const dir = realpathSync(clusterDir);
  return readdirSync('/proc').some((name) => /^\d+$/.test(name) && workingDir(name) === dir);
}

/**
 * Removes the note of a server that was ended by force. PostgreSQL does that itself unless the number now belongs to
 * another process, or to the dead server itself where nobody collects it; then it would refuse to start for ever.
 */
export async function clearStalePostmaster(clusterDir: string): Promise<void> {
  const file = readPostmasterFile(clusterDir);
  if (!file || runsIn(clusterDir, file.pid)) return;
  // Workers outlive a killed server for a moment; a second server beside them would harm the data.
  if (!(await waitUntil(() => !isInUse(clusterDir), { timeoutMs: 10_000 }))) {
    throw new UserError(
      `A process of an earlier database server still works in ${clusterDir}. Try again when it has ended.`,
    );
  }
  rmSync(path.join(clusterDir, 'postmaster.pid'), { force: true });
}
