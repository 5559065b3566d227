import { spawn } from 'node:child_process';
import { once } from 'node:events';
import {
  chmodSync,
  existsSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import net from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { Client } from 'pg';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { isPortFree } from '../lib/ports';
import { processIdentity } from '../lib/process-identity';
import { projectRoot } from '../lib/project-paths';
import { waitUntil } from '../lib/wait';
import { readRecord, recordFile } from './cluster-record';
import { ensureCluster } from './ensure-cluster';
import type { RunningCluster } from './ensure-cluster';

let folder: string;
let dataDir: string;
const running: RunningCluster[] = [];

async function start(): Promise<RunningCluster> {
  const cluster = await ensureCluster({ dataDir });
  running.push(cluster);
  return cluster;
}

async function query(url: string, text: string): Promise<unknown[]> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<Record<string, unknown>>(text)).rows;
  } finally {
    await client.end();
  }
}

const clusterDir = () => path.join(readRecord(dataDir)?.base ?? '', 'cluster');
const postmasterPid = () => Number(readFileSync(path.join(clusterDir(), 'postmaster.pid'), 'utf8').split('\n')[0]);

async function killServer(): Promise<void> {
  const pid = postmasterPid();
  process.kill(pid, 'SIGKILL');
  await waitUntil(() => processIdentity(pid) === null, { timeoutMs: 5_000 });
}

async function listenOn(port: number): Promise<net.Server> {
  const server = net.createServer((socket) => socket.end('still here'));
  server.listen(port, '127.0.0.1');
  await once(server, 'listening');
  return server;
}

beforeEach(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'slighthill-cluster-test-'));
  // Open to the server's account, as a project folder is.
  chmodSync(folder, 0o755);
  dataDir = path.join(folder, '.data');
});

afterEach(async () => {
  for (const cluster of running.splice(0)) await cluster.stop();
  rmSync(folder, { recursive: true, force: true });
});

describe('a lasting cluster', () => {
  it('keeps its data and its port over a stop and a start', async () => {
    const first = await start();
    await query(first.url, 'create table kept as select 42 as answer');
    await first.stop();
    expect(await isPortFree(first.port)).toBe(true);
    expect(path.dirname(readRecord(dataDir)?.base ?? '')).toBe(dataDir);
    const second = await start();
    expect(second.started).toBe(true);
    expect(second.url).toBe(first.url);
    expect(await query(second.url, 'select answer from kept')).toEqual([{ answer: 42 }]);
  });

  it('is found running, not started twice', async () => {
    const first = await start();
    const pid = postmasterPid();
    const second = await start();
    expect(second).toMatchObject({ started: false, url: first.url });
    expect(postmasterPid()).toBe(pid);
  });

  it('tells only its owner how to reach it, and listens on loopback with a password', async () => {
    const cluster = await start();
    expect(statSync(recordFile(dataDir)).mode & 0o777).toBe(0o600);
    expect(await query(cluster.url, 'show listen_addresses')).toEqual([{ listen_addresses: '127.0.0.1' }]);
    const withoutPassword = cluster.url.replace(/:[0-9a-f]+@/, ':wrong@');
    await expect(query(withoutPassword, 'select 1')).rejects.toMatchObject({ code: '28P01' });
  });

  it('comes back after the server was killed, on the same port, with what was committed', async () => {
    const first = await start();
    await query(first.url, 'create table kept as select 42 as answer');
    await killServer();
    const second = await start();
    expect(second).toMatchObject({ started: true, url: first.url });
    expect(await query(second.url, 'select answer from kept')).toEqual([{ answer: 42 }]);
  });

  it('is not misled by the number of a dead server that now belongs to another process', async () => {
    const first = await start();
    await killServer();
    const file = path.join(clusterDir(), 'postmaster.pid');
    const [, ...rest] = readFileSync(file, 'utf8').split('\n');
    writeFileSync(file, [String(process.pid), ...rest].join('\n'));
    const second = await start();
    expect(second).toMatchObject({ started: true, url: first.url });
    expect(await query(second.url, 'select 1 as one')).toEqual([{ one: 1 }]);
  });

  it('leaves a program alone that has taken its port meanwhile, and takes another', async () => {
    const first = await start();
    await first.stop();
    const foreign = await listenOn(first.port);
    try {
      const second = await start();
      expect(second.port).not.toBe(first.port);
      expect(readRecord(dataDir)?.port).toBe(second.port);
      const socket = net.connect(first.port, '127.0.0.1');
      const [answer] = (await once(socket, 'data')) as [Buffer];
      expect(answer.toString()).toBe('still here');
    } finally {
      foreign.close();
    }
  });

  it('never adopts an old cluster: without its record a new one is made and the old one stays', async () => {
    const first = await start();
    const old = clusterDir();
    await query(first.url, 'create table old_data (id int)');
    await first.stop();
    rmSync(recordFile(dataDir));
    const second = await start();
    expect(clusterDir()).not.toBe(old);
    expect(await query(second.url, "select to_regclass('old_data') as found")).toEqual([{ found: null }]);
    expect(existsSync(path.join(old, 'PG_VERSION'))).toBe(true);
  });

  it('starts anew when an earlier start was cut off while making the files', async () => {
    await (await start()).stop();
    const base = readRecord(dataDir)?.base ?? '';
    rmSync(path.join(base, 'cluster'), { recursive: true });
    const second = await start();
    expect(await query(second.url, 'select 1 as one')).toEqual([{ one: 1 }]);
    expect(readdirSync(dataDir)).toContain('postgres.json');
  });
});

describe('a throw-away cluster', () => {
  it('is gone after its stop', async () => {
    const cluster = await ensureCluster({ dataDir, throwAway: true });
    const [row] = await query(cluster.url, 'show data_directory');
    const { data_directory: dir } = row as { data_directory: string };
    expect(existsSync(dir)).toBe(true);
    await cluster.stop();
    expect(existsSync(path.dirname(dir))).toBe(false);
    expect(await isPortFree(cluster.port)).toBe(true);
  });

  it('of a run that was killed is swept away by the next one', async () => {
    const module = JSON.stringify(path.join(projectRoot, 'infra/postgres/ensure-cluster.ts'));
    const code = `import(${module}).then(async ({ ensureCluster }) => {
      const cluster = await ensureCluster({ dataDir: '', throwAway: true });
      console.log(JSON.stringify({ url: cluster.url, port: cluster.port }));
      setInterval(() => undefined, 1000);
    });`;
    const child = spawn(process.execPath, ['--import', 'tsx', '--eval', code], { cwd: projectRoot });
    const [line] = (await once(child.stdout, 'data')) as [Buffer];
    const left = JSON.parse(line.toString()) as { url: string; port: number };
    const [row] = await query(left.url, 'show data_directory');
    const { data_directory: dir } = row as { data_directory: string };
    child.kill('SIGKILL');
    await once(child, 'exit');
    expect(await isPortFree(left.port)).toBe(false);

    const next = await ensureCluster({ dataDir, throwAway: true });
    await next.stop();
    expect(existsSync(path.dirname(dir))).toBe(false);
    expect(await isPortFree(left.port)).toBe(true);
  });
});
