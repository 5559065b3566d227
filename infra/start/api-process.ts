import { spawn } from 'node:child_process';
import { closeSync, existsSync, mkdirSync, openSync, readFileSync, renameSync, statSync } from 'node:fs';
import path from 'node:path';
import { apiEntry } from '../build/bundle-api';
import { markProcess } from '../lib/process-identity';
import type { ProcessMark } from '../lib/process-identity';
import { stopProcess } from '../lib/stop-process';
import { UserError } from '../lib/user-error';
import { waitUntil } from '../lib/wait';

export interface ApiProcess {
  mark: ProcessMark;
  logFile: string;
  /** Resolves with a description of the end. */
  ended: Promise<string>;
  stop(): Promise<void>;
}

export interface ApiProcessOptions {
  port: number;
  logDir: string;
  env: Record<string, string>;
  /** Told at once, so that the process is known even if this one is ended by force before it is ready. */
  onSpawned?: (mark: ProcessMark) => void;
}

const keptLogBytes = 10 * 1024 * 1024;

function openLog(logDir: string): { logFile: string; descriptor: number } {
  mkdirSync(logDir, { recursive: true, mode: 0o700 });
  const logFile = path.join(logDir, 'api.log');
  if (existsSync(logFile) && statSync(logFile).size > keptLogBytes) renameSync(logFile, `${logFile}.1`);
  return { logFile, descriptor: openSync(logFile, 'a', 0o600) };
}

export function lastLines(file: string, count = 12): string {
  return readFileSync(file, 'utf8').trimEnd().split('\n').slice(-count).join('\n');
}

async function isReady(port: number): Promise<boolean> {
  try {
    const response = await fetch(`http://127.0.0.1:${port}/api/health/ready`, { signal: AbortSignal.timeout(2_000) });
    await response.arrayBuffer();
    return response.ok;
  } catch {
    return false;
  }
}

/** Starts the bundled API as a process of its own and returns once it is ready to serve. */
export async function startApi(options: ApiProcessOptions): Promise<ApiProcess> {
  const { logFile, descriptor } = openLog(options.logDir);
  const child = spawn(process.execPath, ['--enable-source-maps', apiEntry], {
    stdio: ['ignore', descriptor, descriptor],
    env: { ...process.env, ...options.env, PORT: String(options.port) },
  });
  closeSync(descriptor);
  let end: string | null = null;
  const ended = new Promise<string>((resolve) => {
    const finish = (text: string) => {
      end = text;
      resolve(text);
    };
    child.once('error', (error) => finish(error.message));
    child.once('exit', (code, signal) => finish(signal ? `ended by ${signal}` : `exit code ${code}`));
  });
  const mark = child.pid === undefined ? null : markProcess(child.pid);
  if (mark) options.onSpawned?.(mark);
  const stop = async () => {
    if (end === null && mark) await stopProcess(mark);
    await ended;
  };
  const ready = await waitUntil(async () => end !== null || (await isReady(options.port)), {
    timeoutMs: 30_000,
    everyMs: 100,
  });
  if (end === null && ready && mark) return { mark, logFile, ended, stop };
  await stop();
  throw new UserError(
    `The API did not start (${end ?? 'not ready in time'}). Its log, ${logFile}, ends with:\n${lastLines(logFile)}`,
  );
}
