import { createHash, randomBytes } from 'node:crypto';
import { existsSync, lstatSync, mkdirSync, realpathSync, statSync } from 'node:fs';
import path from 'node:path';
import { handOver } from './server-account';
import type { ServerAccount } from './server-account';

/** Can the account reach into this folder, through all folders above it? */
export function canEnter(dir: string, account: ServerAccount): boolean {
  if (!account.isOther) return true;
  let current = realpathSync(dir);
  for (;;) {
    const stat = statSync(current);
    const asOwner = stat.uid === account.uid && (stat.mode & 0o100) !== 0;
    const asGroup = stat.gid === account.gid && (stat.mode & 0o010) !== 0;
    if (!asOwner && !asGroup && (stat.mode & 0o001) === 0) return false;
    const parent = path.dirname(current);
    if (parent === current) return true;
    current = parent;
  }
}

/** Where a new cluster would lie: in the data folder, or outside where the account cannot reach that. */
export function newClusterBase(dataDir: string, account: ServerAccount): string {
  const unique = randomBytes(4).toString('hex');
  if (canEnter(dataDir, account)) return path.join(dataDir, `postgres-${unique}`);
  const project = createHash('sha256').update(realpathSync(dataDir)).digest('hex').slice(0, 12);
  return path.join('/var/tmp', `slighthill-${project}-${unique}`);
}

/** Makes a folder of our own for a new cluster. An existing one is never adopted: its name is new each time. */
export function makeClusterBase(dataDir: string, account: ServerAccount): string {
  // With the default mode: a mode given to mkdir would lock the account out of the folders above as well.
  mkdirSync(dataDir, { recursive: true });
  const base = newClusterBase(dataDir, account);
  mkdirSync(base, { mode: 0o700 });
  handOver(base, account);
  return base;
}

/** Is this still the folder we made, and nobody else's? */
export function isOurBase(base: string, account: ServerAccount): boolean {
  if (!existsSync(base)) return false;
  const stat = lstatSync(base);
  return stat.isDirectory() && stat.uid === account.uid && (stat.mode & 0o077) === 0;
}
