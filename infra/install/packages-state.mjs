import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/**
 * @typedef {{ version?: string, integrity?: string, link?: boolean, optional?: boolean, devOptional?: boolean, peer?: boolean,
 *   dependencies?: Record<string, string>, devDependencies?: Record<string, string>, workspaces?: string[] }} LockEntry
 * @typedef {{ packages: Record<string, LockEntry> }} Lock
 */

/** @param {string} file @returns {any} */
const readJson = (file) => JSON.parse(readFileSync(file, 'utf8'));

/** @param {string} projectRoot */
const stampFile = (projectRoot) => path.join(projectRoot, 'node_modules', '.slighthill-packages');

/** @param {string} projectRoot @returns {string[]} */
function manifestFiles(projectRoot) {
  const root = path.join(projectRoot, 'package.json');
  /** @type {string[]} */
  const workspaces = readJson(root).workspaces ?? [];
  return [root, ...workspaces.map((name) => path.join(projectRoot, name, 'package.json'))];
}

/**
 * What the installed packages depend on: the lock file, every package.json and the platform (binaries differ).
 *
 * @param {string} projectRoot
 */
export function packagesFingerprint(projectRoot) {
  const hash = createHash('sha256').update(`${process.platform} ${process.arch} ${process.versions.modules}`);
  for (const file of [path.join(projectRoot, 'package-lock.json'), ...manifestFiles(projectRoot)]) {
    hash.update(`\0${path.relative(projectRoot, file)}\0`).update(readFileSync(file));
  }
  return hash.digest('hex');
}

/** @param {Record<string, string> | undefined} a @param {Record<string, string> | undefined} b */
function sameEntries(a = {}, b = {}) {
  const keys = Object.keys(a);
  return keys.length === Object.keys(b).length && keys.every((key) => a[key] === b[key]);
}

/**
 * Does what lies in node_modules match the lock file? npm writes its own list there as the last step of an install,
 * so an interrupted one leaves none.
 *
 * @param {string} projectRoot
 */
function installedMatchesLock(projectRoot) {
  const hidden = path.join(projectRoot, 'node_modules', '.package-lock.json');
  if (!existsSync(hidden)) return false;
  /** @type {Lock} */
  const lock = readJson(path.join(projectRoot, 'package-lock.json'));
  /** @type {Lock} */
  const installed = readJson(hidden);
  const manifestsAgree = manifestFiles(projectRoot).every((file) => {
    const manifest = readJson(file);
    const entry = lock.packages[path.relative(projectRoot, path.dirname(file)).split(path.sep).join('/')];
    return (
      entry !== undefined &&
      sameEntries(manifest.dependencies, entry.dependencies) &&
      sameEntries(manifest.devDependencies, entry.devDependencies)
    );
  });
  if (!manifestsAgree) return false;
  return Object.entries(lock.packages).every(([location, entry]) => {
    if (!location.includes('node_modules/')) return true;
    const found = installed.packages[location];
    if (!found) return entry.optional === true || entry.devOptional === true;
    return found.version === entry.version && found.integrity === entry.integrity && found.link === entry.link;
  });
}

/**
 * Are the packages there and those of the lock file? The stamp answers quickly; without it the installed list is
 * compared, so that an `npm install` by hand is not followed by a second one.
 *
 * @param {string} projectRoot
 * @returns {'fresh' | 'missing' | 'stale'}
 */
export function packagesState(projectRoot) {
  if (!existsSync(path.join(projectRoot, 'node_modules'))) return 'missing';
  const stamp = stampFile(projectRoot);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === packagesFingerprint(projectRoot)) return 'fresh';
  if (!installedMatchesLock(projectRoot)) return 'stale';
  stampPackages(projectRoot);
  return 'fresh';
}

/** Remembers that the packages match. @param {string} projectRoot */
export function stampPackages(projectRoot) {
  writeFileSync(stampFile(projectRoot), packagesFingerprint(projectRoot));
}
