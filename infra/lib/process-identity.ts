import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';

const hasProc = existsSync('/proc/self/stat');

function procStat(pid: number): { state: string; startTicks: string } | null {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The command name stands in parentheses and may hold spaces: fields are counted after the last one.
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return { state: fields[0] ?? '?', startTicks: fields[19] ?? '' };
  } catch {
    return null;
  }
}

/**
 * A text that is equal only for the same running process: numbers are given out again after a process has ended.
 * Null when no such process runs; one that ended but was not collected by its parent (a zombie) does not run.
 */
export function processIdentity(pid: number): string | null {
  if (!Number.isInteger(pid) || pid <= 0) return null;
  if (hasProc) {
    const stat = procStat(pid);
    if (!stat || stat.state === 'Z' || stat.state === 'X') return null;
    return `${readFileSync('/proc/sys/kernel/random/boot_id', 'utf8').trim()}:${stat.startTicks}`;
  }
  const ps = spawnSync('ps', ['-o', 'stat=,lstart=', '-p', String(pid)], { encoding: 'utf8' });
  const line = ps.status === 0 ? ps.stdout.trim() : '';
  return line && !line.startsWith('Z') ? line.slice(line.indexOf(' ')).trim() : null;
}

export interface ProcessMark {
  pid: number;
  identity: string;
}

/** Mark of a running process, to be stored and recognized later. */
export function markProcess(pid: number): ProcessMark | null {
  const identity = processIdentity(pid);
  return identity ? { pid, identity } : null;
}

export function isStillRunning(mark: ProcessMark | null | undefined): boolean {
  return mark != null && processIdentity(mark.pid) === mark.identity;
}
