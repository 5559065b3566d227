import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';

const debianRoot = '/usr/lib/postgresql';
const needed = ['initdb', 'pg_ctl', 'postgres', 'pg_isready', 'pg_dump', 'pg_restore'];

const isComplete = (dir: string) => needed.every((name) => existsSync(path.join(dir, name)));

function debianMajors(): string[] {
  if (!existsSync(debianRoot)) return [];
  return readdirSync(debianRoot)
    .filter((name) => /^\d+$/.test(name))
    .sort((a, b) => Number(b) - Number(a));
}

/**
 * Folder of the server's programs, or null. An existing cluster only opens with its own major version, a new one takes
 * the newest. Debian keeps the programs out of the PATH.
 */
export function findBinaries(clusterDir?: string): string | null {
  const own = process.env.POSTGRES_BIN;
  if (own && isComplete(own)) return own;
  const versionFile = clusterDir ? path.join(clusterDir, 'PG_VERSION') : null;
  const major = versionFile && existsSync(versionFile) ? readFileSync(versionFile, 'utf8').trim() : null;
  const majors = major ? [major] : debianMajors();
  const candidates = majors.map((name) => path.join(debianRoot, name, 'bin'));
  const fromPath = (process.env.PATH ?? '').split(path.delimiter).filter(Boolean);
  return [...candidates, ...fromPath].find(isComplete) ?? null;
}
