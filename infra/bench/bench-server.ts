import { spawn, type ChildProcess } from 'node:child_process';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { webDist } from '../build/build-web';
import { findFreePort } from '../lib/ports';
import { projectRoot } from '../lib/project-paths';
import { waitUntil } from '../lib/wait';

export const benchEntry = path.join(projectRoot, 'api', 'dist', 'bench-server.js');

export interface BenchServer {
  base: string;
  residentMb(): number;
  stop(): Promise<void>;
}

/** Starts the measured API as a process of its own, bundled as the product is. */
export async function startBenchServer(databaseUrl: string): Promise<BenchServer> {
  const port = await findFreePort();
  const child = spawn(process.execPath, [benchEntry], {
    stdio: ['ignore', 'inherit', 'inherit'],
    env: {
      ...process.env,
      DATABASE_URL: databaseUrl,
      PORT: String(port),
      WEB_DIST: webDist,
      NODE_ENV: 'development',
      LOG_LEVEL: 'silent',
    },
  });
  const base = `http://127.0.0.1:${port}`;
  const ready = await waitUntil(async () => child.exitCode !== null || (await isReady(base)), {
    timeoutMs: 20_000,
    everyMs: 100,
  });
  if (!ready || child.exitCode !== null) {
    await end(child);
    throw new Error('The measured API did not start.');
  }
  return { base, residentMb: () => residentMb(child.pid ?? 0), stop: () => end(child) };
}

async function isReady(base: string): Promise<boolean> {
  try {
    return (await fetch(`${base}/api/health/ready`)).ok;
  } catch {
    return false;
  }
}

function residentMb(pid: number): number {
  const match = /VmRSS:\s+(\d+) kB/.exec(readFileSync(`/proc/${pid}/status`, 'utf8'));
  return Number(match?.[1] ?? 0) / 1024;
}

async function end(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null) return;
  const ended = new Promise((resolve) => child.once('exit', resolve));
  child.kill('SIGKILL');
  await ended;
}
