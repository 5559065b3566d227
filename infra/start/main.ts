import path from 'node:path';
import { bundleApi } from '../build/bundle-api';
import { buildWeb, webDist } from '../build/build-web';
import { interruption, Interrupted, listenForInterruption } from '../lib/interruption';
import { step } from '../lib/progress';
import { dataDir } from '../lib/project-paths';
import { readPort, requireFreePort } from '../lib/read-port';
import { runMain } from '../lib/run-main';
import type { RunningLock } from '../lib/running-lock';
import { waitUntil } from '../lib/wait';
import { ensureDatabase } from '../postgres/ensure-database';
import { lastLines, startApi } from './api-process';
import type { ApiProcess } from './api-process';
import { claimFolder } from './claim-folder';
import { isDemoWanted, prepareDatabase } from './prepare-database';
import { printAddresses } from './print-addresses';

async function launch(databaseUrl: string, port: number, lock: RunningLock, signal: AbortSignal): Promise<ApiProcess> {
  await prepareDatabase(databaseUrl, { demo: isDemoWanted() });
  signal.throwIfAborted();
  await buildWeb(signal);
  await bundleApi();
  signal.throwIfAborted();
  return step('Starting the API', () =>
    startApi({
      port,
      logDir: path.join(dataDir, 'logs'),
      env: { DATABASE_URL: databaseUrl, WEB_DIST: webDist },
      onSpawned: (mark) => lock.update({ port, api: mark }),
    }),
  );
}

/** Waits for Ctrl-C (true) or for the API's own end (false). */
async function serve(api: ApiProcess, signal: AbortSignal): Promise<boolean> {
  const first = await Promise.race([interruption(signal), api.ended]);
  // Ctrl-C reaches the API as well, and its end may be heard of first.
  if (first !== 'interrupted') await waitUntil(() => signal.aborted, { timeoutMs: 500 });
  return signal.aborted;
}

async function run(lock: RunningLock, port: number, signal: AbortSignal): Promise<number> {
  const database = await ensureDatabase(dataDir);
  let api: ApiProcess | null = null;
  try {
    signal.throwIfAborted();
    api = await launch(database.url, port, lock, signal);
    printAddresses({ port, logFile: api.logFile, demo: isDemoWanted() });
    if (await serve(api, signal)) {
      console.log('Stopping …');
      return 0;
    }
    console.error(`The API ended by itself (${await api.ended}). Its log ends with:\n${lastLines(api.logFile)}`);
    return 1;
  } finally {
    await api?.stop();
    await database.stop();
  }
}

await runMain(async () => {
  const port = readPort('PORT', 4310);
  const signal = listenForInterruption();
  console.log('Slighthill');
  const lock = await claimFolder('start');
  try {
    await requireFreePort('PORT', port, 'npm start');
    const code = await run(lock, port, signal);
    console.log('Stopped. The data is kept.');
    return code;
  } catch (error) {
    // A build that was cut off by Ctrl-C failed because of it.
    throw signal.aborted ? new Interrupted('Stopped before it was ready. Nothing was lost.') : error;
  } finally {
    lock.release();
  }
});
