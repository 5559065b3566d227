import { spawn } from 'node:child_process';
import path from 'node:path';
import { interruption, Interrupted, listenForInterruption } from '../lib/interruption';
import { findFreePort } from '../lib/ports';
import { markProcess } from '../lib/process-identity';
import { dataDir, projectRoot } from '../lib/project-paths';
import { readPort, requireFreePort } from '../lib/read-port';
import { runMain } from '../lib/run-main';
import type { RunningLock } from '../lib/running-lock';
import { stopProcess } from '../lib/stop-process';
import { ensureDatabase } from '../postgres/ensure-database';
import { claimFolder } from '../start/claim-folder';
import { isDemoWanted, prepareDatabase } from '../start/prepare-database';

interface Watcher {
  pid: number;
  ended: Promise<string>;
  stop(): Promise<void>;
}

function startWatcher(label: string, args: string[], cwd: string, env: Record<string, string>): Watcher {
  const child = spawn(process.execPath, args, {
    cwd,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: { ...process.env, ...env },
  });
  const ended = new Promise<string>((resolve) => {
    child.once('error', (error) => resolve(`${label}: ${error.message}`));
    child.once('exit', (code, signal) => resolve(`${label} ended (${signal ?? `exit code ${code}`})`));
  });
  const mark = child.pid === undefined ? null : markProcess(child.pid);
  const stop = async () => {
    if (!mark) return;
    await stopProcess(mark, 5_000);
    await ended;
  };
  return { pid: child.pid ?? 0, ended, stop };
}

async function watch(lock: RunningLock, port: number, signal: AbortSignal): Promise<number> {
  const database = await ensureDatabase(dataDir);
  const watchers: Watcher[] = [];
  try {
    await prepareDatabase(database.url, { demo: isDemoWanted() });
    signal.throwIfAborted();
    const apiPort = await findFreePort();
    const apiArgs = ['--watch', '--import', 'tsx', path.join(projectRoot, 'api/src/main.ts')];
    const api = startWatcher('The API', apiArgs, projectRoot, { DATABASE_URL: database.url, PORT: String(apiPort) });
    watchers.push(api);
    const mark = markProcess(api.pid);
    lock.update({ port, ...(mark ? { api: mark } : {}) });
    const vite = path.join(projectRoot, 'node_modules/vite/bin/vite.js');
    const webArgs = [vite, '--port', String(port), '--strictPort', '--clearScreen', 'false'];
    watchers.push(
      startWatcher('The web server', webArgs, path.join(projectRoot, 'web'), {
        API_URL: `http://127.0.0.1:${apiPort}`,
      }),
    );
    console.log(`\nSlighthill in watch mode: http://127.0.0.1:${port} (API on ${apiPort}). Press Ctrl-C to stop.\n`);
    const first = await Promise.race([interruption(signal), ...watchers.map((watcher) => watcher.ended)]);
    if (first === 'interrupted' || signal.aborted) return 0;
    console.error(first);
    return 1;
  } finally {
    await Promise.all(watchers.map((watcher) => watcher.stop()));
    await database.stop();
  }
}

await runMain(async () => {
  const port = readPort('PORT', 4310);
  const signal = listenForInterruption();
  const lock = await claimFolder('dev');
  try {
    await requireFreePort('PORT', port, 'npm run dev');
    return await watch(lock, port, signal);
  } catch (error) {
    throw signal.aborted ? new Interrupted('Stopped.') : error;
  } finally {
    lock.release();
  }
});
