import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { findFreePort, isPortFree } from '../lib/ports';
import { waitUntil } from '../lib/wait';
import { clearStalePostmaster, runningServer } from './postmaster';
import { handOver } from './server-account';
import type { ServerAccount } from './server-account';
import { runServerTool } from './server-tools';

/** One cluster on disk: `<base>/cluster` with its log beside it. */
export interface ClusterFiles {
  base: string;
  binDir: string;
  account: ServerAccount;
}

export const clusterDirOf = (base: string) => path.join(base, 'cluster');
const logOf = (base: string) => path.join(base, 'server.log');

// A throw-away cluster need not survive a power cut.
const throwAwaySettings = [
  'fsync=off',
  'synchronous_commit=off',
  'full_page_writes=off',
  'autovacuum=off',
  'wal_level=minimal',
  'max_wal_senders=0',
  'max_wal_size=1GB',
];

/** Makes the cluster's files. A half-made cluster is never taken for a whole one: the last step is a rename. */
export function createCluster(files: ClusterFiles, user: string, throwAway: boolean): string {
  const { base, binDir, account } = files;
  const password = randomBytes(24).toString('hex');
  const unfinished = path.join(base, 'cluster.unfinished');
  const passwordFile = path.join(base, 'password');
  rmSync(unfinished, { recursive: true, force: true });
  writeFileSync(passwordFile, password, { mode: 0o600 });
  handOver(passwordFile, account);
  const args = ['-D', unfinished, '-U', user, `--pwfile=${passwordFile}`, '-A', 'scram-sha-256', '-E', 'UTF8'];
  args.push('--locale=C.UTF-8', '--data-checksums', ...(throwAway ? ['-N'] : []));
  const result = runServerTool(binDir, 'initdb', args, account);
  rmSync(passwordFile, { force: true });
  if (result.code !== 0) throw new Error(`The database cluster could not be made:\n${result.output}`);
  renameSync(unfinished, clusterDirOf(base));
  return password;
}

function isAnswering({ binDir, account }: ClusterFiles, port: number): boolean {
  return runServerTool(binDir, 'pg_isready', ['-q', '-h', '127.0.0.1', '-p', String(port)], account).code === 0;
}

/** Port of the running server once it answers, or null when none runs. */
async function portOfRunning(files: ClusterFiles): Promise<number | null> {
  let port: number | null = null;
  const settled = await waitUntil(
    () => {
      const server = runningServer(clusterDirOf(files.base));
      if (!server) return true;
      port = server.port;
      return port !== null && isAnswering(files, port);
    },
    { timeoutMs: 10_000, everyMs: 100 },
  );
  if (!settled)
    throw new Error(`The database server of this folder runs but does not answer; its log is ${logOf(files.base)}.`);
  return runningServer(clusterDirOf(files.base)) ? port : null;
}

function startOn(files: ClusterFiles, port: number, throwAway: boolean): boolean {
  const { base, binDir, account } = files;
  const settings = ['listen_addresses=127.0.0.1', `port=${port}`, "unix_socket_directories=''"];
  const options = [...settings, ...(throwAway ? throwAwaySettings : [])].map((setting) => `-c ${setting}`).join(' ');
  const log = logOf(base);
  rmSync(log, { force: true });
  const args = ['start', '-w', '-t', '120', '-D', clusterDirOf(base), '-l', log, '-o', options];
  return runServerTool(binDir, 'pg_ctl', args, account, { keepOutput: false }).code === 0;
}

/** Starts the server, or finds it running, and returns its port: the wished one when it is free. */
export async function startCluster(
  files: ClusterFiles,
  wishedPort: number | null,
  throwAway: boolean,
): Promise<{ port: number; started: boolean }> {
  const running = await portOfRunning(files);
  if (running !== null) return { port: running, started: false };
  await clearStalePostmaster(clusterDirOf(files.base));
  for (let attempt = 1; ; attempt++) {
    const useWished = attempt === 1 && wishedPort !== null && (await isPortFree(wishedPort));
    const port = useWished ? wishedPort : await findFreePort();
    if (startOn(files, port, throwAway)) return { port, started: true };
    const log = existsSync(logOf(files.base)) ? readFileSync(logOf(files.base), 'utf8') : '';
    // Between the look and the start another program may have taken the port.
    if (attempt < 4 && /could not bind|Address already in use/i.test(log)) continue;
    throw new Error(`The database server did not start:\n${log.trim().split('\n').slice(-12).join('\n')}`);
  }
}

/** Stops the server of the cluster if it runs: at once and without care for the data, or cleanly. */
export function stopCluster({ base, binDir, account }: ClusterFiles, mode: 'fast' | 'immediate'): void {
  if (!existsSync(clusterDirOf(base)) || !runningServer(clusterDirOf(base))) return;
  runServerTool(binDir, 'pg_ctl', ['stop', '-w', '-t', '60', '-m', mode, '-D', clusterDirOf(base)], account);
}
