import { linkSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { isStillRunning, markProcess } from './process-identity';
import type { ProcessMark } from './process-identity';

export interface RunningState {
  command: string;
  owner: ProcessMark;
  port?: number;
  api?: ProcessMark;
}

export interface RunningLock {
  /** What an earlier command left behind when it was ended by force. */
  leftBehind: RunningState | null;
  update(change: Partial<Pick<RunningState, 'port' | 'api'>>): void;
  release(): void;
}

const lockFile = (dataDir: string) => path.join(dataDir, 'running.json');

function read(file: string): RunningState | null {
  try {
    return JSON.parse(readFileSync(file, 'utf8')) as RunningState;
  } catch {
    return null;
  }
}

/** The command that runs the product from this folder now, if any. */
export function whoIsRunning(dataDir: string): RunningState | null {
  const state = read(lockFile(dataDir));
  return state && isStillRunning(state.owner) ? state : null;
}

function linkIfAbsent(from: string, to: string): boolean {
  try {
    linkSync(from, to);
    return true;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'EEXIST') return false;
    throw error;
  }
}

/** Removes the lock of a process that is gone and returns what it said. */
function takeAside(file: string): RunningState | null {
  const aside = `${file}.${process.pid}.old`;
  try {
    renameSync(file, aside);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw error;
  }
  const state = read(aside);
  // Another process may have replaced the remains between the look and the rename: it gets its lock back.
  if (state && isStillRunning(state.owner)) linkIfAbsent(aside, file);
  rmSync(aside, { force: true });
  return state && isStillRunning(state.owner) ? null : state;
}

/** Makes this process the one that runs the product from this folder; null when another one does. */
export function takeRunningLock(dataDir: string, command: string): RunningLock | null {
  const file = lockFile(dataDir);
  const owner = markProcess(process.pid);
  if (!owner) throw new Error('This process does not find itself.');
  mkdirSync(dataDir, { recursive: true });
  let state: RunningState = { command, owner };
  let leftBehind: RunningState | null = null;
  const fresh = `${file}.${process.pid}`;
  writeFileSync(fresh, JSON.stringify(state), { mode: 0o600 });
  try {
    // A link appears whole or not at all, so nobody ever reads half a lock.
    while (!linkIfAbsent(fresh, file)) {
      if (whoIsRunning(dataDir)) return null;
      leftBehind = takeAside(file) ?? leftBehind;
    }
  } finally {
    rmSync(fresh, { force: true });
  }
  return {
    leftBehind,
    update(change) {
      state = { ...state, ...change };
      writeFileSync(`${file}.new`, JSON.stringify(state), { mode: 0o600 });
      renameSync(`${file}.new`, file);
    },
    release: () => rmSync(file, { force: true }),
  };
}
