import { existsSync, lstatSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { isStillRunning, markProcess } from '../lib/process-identity';
import type { ProcessMark } from '../lib/process-identity';
import { clusterDirOf, stopCluster } from './cluster';
import { canEnter } from './cluster-location';
import { findBinaries } from './find-binaries';
import { handOver, serverAccount } from './server-account';
import type { ServerAccount } from './server-account';

const prefix = 'slighthill-throw-away-';

function temporaryDir(account: ServerAccount): string {
  return canEnter(os.tmpdir(), account) ? os.tmpdir() : '/var/tmp';
}

/** A folder for a cluster that lives as long as this process; who owns it is written inside. */
export function makeThrowAwayBase(account: ServerAccount): string {
  const base = path.join(temporaryDir(account), `${prefix}${process.pid}-${Date.now().toString(36)}`);
  mkdirSync(base, { mode: 0o700 });
  writeFileSync(path.join(base, 'owner.json'), JSON.stringify(markProcess(process.pid)));
  handOver(base, account);
  return base;
}

function ownerOf(base: string): ProcessMark | null {
  try {
    return JSON.parse(readFileSync(path.join(base, 'owner.json'), 'utf8')) as ProcessMark;
  } catch {
    return null;
  }
}

/** Removes the throw-away clusters of processes that were ended by force, and returns the folders removed. */
export function sweepThrowAway(): string[] {
  const account = serverAccount();
  const dir = temporaryDir(account);
  const left = readdirSync(dir)
    .filter((name) => name.startsWith(prefix))
    .map((name) => path.join(dir, name))
    .filter((base) => lstatSync(base).isDirectory() && lstatSync(base).uid === account.uid)
    .filter((base) => {
      const owner = ownerOf(base);
      // A folder without an owner is being made right now, unless it is old.
      return owner ? !isStillRunning(owner) : Date.now() - lstatSync(base).mtimeMs > 60_000;
    });
  for (const base of left) {
    const binDir = existsSync(clusterDirOf(base)) ? findBinaries(clusterDirOf(base)) : null;
    if (binDir) stopCluster({ base, binDir, account }, 'immediate');
    rmSync(base, { recursive: true, force: true });
  }
  return left;
}
