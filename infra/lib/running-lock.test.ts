import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { isStillRunning, markProcess, processIdentity } from './process-identity';
import { takeRunningLock, whoIsRunning } from './running-lock';
import { stopProcess } from './stop-process';

let dataDir: string;
const children: ReturnType<typeof spawn>[] = [];

function sleeper(code = 'setInterval(() => undefined, 1000)') {
  const child = spawn(process.execPath, ['--eval', code], { stdio: ['ignore', 'pipe', 'ignore'] });
  children.push(child);
  const mark = markProcess(child.pid ?? 0);
  if (!mark) throw new Error('The child did not start.');
  return { child, mark };
}

beforeEach(() => {
  dataDir = mkdtempSync(path.join(os.tmpdir(), 'slighthill-lock-'));
});

afterEach(() => {
  for (const child of children.splice(0)) child.kill('SIGKILL');
  rmSync(dataDir, { recursive: true, force: true });
});

describe('takeRunningLock', () => {
  it('is given once, and again after its release', () => {
    const lock = takeRunningLock(dataDir, 'start');
    expect(lock?.leftBehind).toBeNull();
    expect(whoIsRunning(dataDir)).toMatchObject({ command: 'start', owner: { pid: process.pid } });
    expect(takeRunningLock(dataDir, 'dev')).toBeNull();
    lock?.release();
    expect(whoIsRunning(dataDir)).toBeNull();
    expect(takeRunningLock(dataDir, 'dev')).not.toBeNull();
  });

  it('passes on what a killed command left running', async () => {
    const owner = sleeper();
    const api = sleeper();
    writeFileSync(
      path.join(dataDir, 'running.json'),
      JSON.stringify({ command: 'start', owner: owner.mark, port: 4310, api: api.mark }),
    );
    expect(takeRunningLock(dataDir, 'start')).toBeNull();
    owner.child.kill('SIGKILL');
    await once(owner.child, 'exit');
    const lock = takeRunningLock(dataDir, 'start');
    expect(lock?.leftBehind).toMatchObject({ port: 4310, api: api.mark });
    expect(isStillRunning(lock?.leftBehind?.api)).toBe(true);
  });

  it('is not held by another process that got the number of the owner', () => {
    const stale = { command: 'start', owner: { pid: process.pid, identity: 'an earlier process' } };
    writeFileSync(path.join(dataDir, 'running.json'), JSON.stringify(stale));
    expect(takeRunningLock(dataDir, 'start')).not.toBeNull();
  });

  it('survives a half-written file', () => {
    writeFileSync(path.join(dataDir, 'running.json'), '{"command":"st');
    const lock = takeRunningLock(dataDir, 'start');
    lock?.update({ port: 4320 });
    const stored: unknown = JSON.parse(readFileSync(path.join(dataDir, 'running.json'), 'utf8'));
    expect(stored).toMatchObject({ command: 'start', port: 4320 });
    lock?.release();
    expect(existsSync(path.join(dataDir, 'running.json'))).toBe(false);
  });
});

describe('processIdentity', () => {
  it('tells processes apart and knows the dead', async () => {
    const { child, mark } = sleeper();
    expect(mark.identity).toBe(processIdentity(mark.pid));
    expect(mark.identity).not.toBe(processIdentity(process.pid));
    child.kill('SIGKILL');
    await once(child, 'exit');
    expect(isStillRunning(mark)).toBe(false);
    expect(processIdentity(0)).toBeNull();
    expect(processIdentity(-1)).toBeNull();
  });
});

describe('stopProcess', () => {
  it('ends a process that ignores the polite request', async () => {
    const { child, mark } = sleeper(
      "process.on('SIGTERM', () => undefined); setInterval(() => undefined, 1000); console.log('up')",
    );
    if (child.stdout) await once(child.stdout, 'data');
    const ended = once(child, 'exit');
    await stopProcess(mark, 200);
    expect((await ended)[1]).toBe('SIGKILL');
  });

  it('leaves a process alone that only has the same number', async () => {
    const { child, mark } = sleeper();
    await stopProcess({ pid: mark.pid, identity: 'another process' }, 200);
    expect(child.exitCode).toBeNull();
    expect(isStillRunning(mark)).toBe(true);
  });
});
