import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import net from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { findFreePort, isPortFree } from '../lib/ports';
import { isStillRunning } from '../lib/process-identity';
import { projectRoot } from '../lib/project-paths';
import type { RunningState } from '../lib/running-lock';
import { stopProcess } from '../lib/stop-process';
import { waitUntil } from '../lib/wait';
import { readRecord } from '../postgres/cluster-record';
import { ensureCluster } from '../postgres/ensure-cluster';

interface Started {
  child: ChildProcess;
  output(): string;
  ended: Promise<unknown[]>;
}

let folder: string;
let dataDir: string;
let port: number;
const started: Started[] = [];

function npmStart(): Started {
  const { npm_lifecycle_event: _npm, DATABASE_URL: _url, ...env } = process.env;
  const child = spawn(process.execPath, ['infra/bootstrap.mjs', 'start'], {
    cwd: projectRoot,
    env: { ...env, NODE_ENV: 'development', DATA_DIR: dataDir, PORT: String(port), DEMO: '0' },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  child.stdout.setEncoding('utf8').on('data', (text: string) => (output += text));
  child.stderr.setEncoding('utf8').on('data', (text: string) => (output += text));
  const entry = { child, output: () => output, ended: once(child, 'exit') };
  started.push(entry);
  return entry;
}

async function ready(entry: Started): Promise<void> {
  await waitUntil(() => /is ready/.test(entry.output()) || entry.child.exitCode !== null, { timeoutMs: 100_000 });
  expect(entry.output()).toContain(`Slighthill is ready: http://127.0.0.1:${port}`);
}

const state = () => JSON.parse(readFileSync(path.join(dataDir, 'running.json'), 'utf8')) as RunningState;
const health = async () => (await fetch(`http://127.0.0.1:${port}/api/health/ready`)).status;

beforeEach(async () => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'slighthill-start-test-'));
  chmodSync(folder, 0o755);
  dataDir = path.join(folder, '.data');
  port = await findFreePort();
});

afterEach(async () => {
  for (const { child, ended } of started.splice(0)) {
    if (child.exitCode === null && child.signalCode === null) {
      child.kill('SIGTERM');
      await ended;
    }
  }
  const left = existsSync(path.join(dataDir, 'running.json')) ? state().api : undefined;
  if (left) await stopProcess(left);
  if (readRecord(dataDir)) await (await ensureCluster({ dataDir })).stop();
  rmSync(folder, { recursive: true, force: true });
});

it('serves until Ctrl-C, refuses a second start meanwhile, and leaves nothing running', async () => {
  const first = npmStart();
  await ready(first);
  expect(await health()).toBe(200);
  expect(await (await fetch(`http://127.0.0.1:${port}/`)).text()).toContain('<div id=');

  const second = npmStart();
  expect((await second.ended)[0]).toBe(1);
  expect(second.output()).toContain(`already runs from this folder at http://127.0.0.1:${port}`);
  expect(await health()).toBe(200);

  const { api } = state();
  first.child.kill('SIGINT');
  expect((await first.ended)[0]).toBe(0);
  expect(isStillRunning(api)).toBe(false);
  expect(await isPortFree(port)).toBe(true);
  expect(await isPortFree(readRecord(dataDir)?.port ?? 0)).toBe(true);
});

it('starts again after everything was killed, ending the API that was left', async () => {
  const first = npmStart();
  await ready(first);
  const left = state().api;
  const base = readRecord(dataDir)?.base ?? '';
  const postmaster = Number(readFileSync(path.join(base, 'cluster', 'postmaster.pid'), 'utf8').split('\n')[0]);
  first.child.kill('SIGKILL');
  process.kill(postmaster, 'SIGKILL');
  await first.ended;
  expect(isStillRunning(left)).toBe(true);

  const second = npmStart();
  await ready(second);
  expect(isStillRunning(left)).toBe(false);
  expect(readRecord(dataDir)?.base).toBe(base);
  expect(await health()).toBe(200);
});

it('ends with an error, and the database stopped, when the API ends by itself', async () => {
  const first = npmStart();
  await ready(first);
  process.kill(state().api?.pid ?? 0, 'SIGKILL');
  expect((await first.ended)[0]).toBe(1);
  expect(first.output()).toContain('The API ended by itself (ended by SIGKILL)');
  expect(await isPortFree(readRecord(dataDir)?.port ?? 0)).toBe(true);
});

it('names the variable when another program has the port, and leaves that program alone', async () => {
  const foreign = net.createServer((socket) => socket.end('still here'));
  foreign.listen(port, '127.0.0.1');
  await once(foreign, 'listening');
  try {
    const first = npmStart();
    expect((await first.ended)[0]).toBe(1);
    expect(first.output()).toMatch(new RegExp(`Port ${port} is used by another program[^]*PORT=\\d+ npm start`));
    const [answer] = (await once(net.connect(port, '127.0.0.1'), 'data')) as [Buffer];
    expect(answer.toString()).toBe('still here');
  } finally {
    foreign.close();
  }
});
