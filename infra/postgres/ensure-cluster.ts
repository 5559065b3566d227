import { existsSync, rmSync } from 'node:fs';
import { Client } from 'pg';
import { clusterDirOf, createCluster, startCluster, stopCluster } from './cluster';
import { isOurBase, makeClusterBase } from './cluster-location';
import { clusterUrl, readRecord, writeRecord } from './cluster-record';
import type { ClusterRecord } from './cluster-record';
import { ensureBinaries } from './install-postgres';
import { serverAccount } from './server-account';
import { makeThrowAwayBase, sweepThrowAway } from './throw-away';

export const databaseName = 'slighthill';
const user = 'app';

export interface RunningCluster {
  /** Address of the product's database. */
  url: string;
  port: number;
  /** False when the server was running before. */
  started: boolean;
  /** Folder of the server's programs (pg_dump and others). */
  binDir: string;
  stop(): Promise<void>;
}

async function ensureDatabaseExists(record: ClusterRecord): Promise<void> {
  const client = new Client({ connectionString: clusterUrl(record, 'postgres') });
  await client.connect();
  try {
    const found = await client.query('select 1 from pg_database where datname = $1', [databaseName]);
    if (found.rowCount === 0) await client.query(`create database ${databaseName}`);
  } finally {
    await client.end();
  }
}

/**
 * A private PostgreSQL server on loopback, made when there is none. A lasting one keeps its data and its port under the
 * data folder; a throw-away one is fast, forgets everything on stop, and sweeps what killed runs left behind.
 */
export async function ensureCluster(options: { dataDir: string; throwAway?: boolean }): Promise<RunningCluster> {
  return options.throwAway ? throwAwayCluster() : lastingCluster(options.dataDir);
}

async function throwAwayCluster(): Promise<RunningCluster> {
  const binDir = await ensureBinaries();
  const account = serverAccount();
  sweepThrowAway();
  const base = makeThrowAwayBase(account);
  const files = { base, binDir, account };
  const stop = async () => {
    stopCluster(files, 'immediate');
    rmSync(base, { recursive: true, force: true });
  };
  try {
    const password = createCluster(files, user, true);
    const { port } = await startCluster(files, null, true);
    const record = { base, port, user, password };
    await ensureDatabaseExists(record);
    return { url: clusterUrl(record, databaseName), port, started: true, binDir, stop };
  } catch (error) {
    await stop();
    throw error;
  }
}

async function lastingCluster(dataDir: string): Promise<RunningCluster> {
  const known = readRecord(dataDir);
  const knownDir = known && existsSync(clusterDirOf(known.base)) ? clusterDirOf(known.base) : undefined;
  const binDir = await ensureBinaries(knownDir);
  const account = serverAccount();
  let record = known && knownDir && isOurBase(known.base, account) ? known : null;
  if (known && !record) console.log(`  The database of ${known.base} is gone or not ours; making a new one.`);
  if (!record) {
    const base = makeClusterBase(dataDir, account);
    const password = createCluster({ base, binDir, account }, user, false);
    record = { base, port: 0, user, password };
    // Written before the start, so that a start cut short does not leave a cluster nobody knows.
    writeRecord(dataDir, record);
  }
  const files = { base: record.base, binDir, account };
  const { port, started } = await startCluster(files, record.port || null, false);
  if (port !== record.port) {
    record = { ...record, port };
    writeRecord(dataDir, record);
  }
  await ensureDatabaseExists(record);
  return { url: clusterUrl(record, databaseName), port, started, binDir, stop: async () => stopCluster(files, 'fast') };
}
