import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { packagesState, stampPackages } from './packages-state.mjs';

let root: string;
const put = (name: string, content: unknown) => writeFileSync(path.join(root, name), JSON.stringify(content));

function lockWith(version: string) {
  return {
    packages: {
      '': { workspaces: ['part'], devDependencies: { tool: '^1.0.0' } },
      part: { dependencies: { helper: '^2.0.0' } },
      'node_modules/part': { resolved: 'part', link: true },
      'node_modules/tool': { version: '1.0.0', integrity: 'sha512-a' },
      'node_modules/helper': { version, integrity: `sha512-${version}` },
      'node_modules/only-elsewhere': { version: '3.0.0', integrity: 'sha512-c', optional: true },
    },
  };
}

function installed(version: string) {
  const { packages } = lockWith(version);
  const { 'node_modules/only-elsewhere': _elsewhere, ...here } = packages;
  return { packages: here };
}

beforeEach(() => {
  root = mkdtempSync(path.join(os.tmpdir(), 'slighthill-packages-'));
  mkdirSync(path.join(root, 'part'));
  put('package.json', { workspaces: ['part'], devDependencies: { tool: '^1.0.0' } });
  put('part/package.json', { dependencies: { helper: '^2.0.0' } });
  put('package-lock.json', lockWith('2.0.0'));
});

afterEach(() => rmSync(root, { recursive: true, force: true }));

describe('packagesState', () => {
  it('is missing without node_modules, and stale where an install was cut off', () => {
    expect(packagesState(root)).toBe('missing');
    mkdirSync(path.join(root, 'node_modules'));
    expect(packagesState(root)).toBe('stale');
  });

  it('accepts what was installed by hand, packages of other platforms aside', () => {
    mkdirSync(path.join(root, 'node_modules'));
    put('node_modules/.package-lock.json', installed('2.0.0'));
    expect(packagesState(root)).toBe('fresh');
  });

  it('is stale when another version is installed than the lock file names', () => {
    mkdirSync(path.join(root, 'node_modules'));
    put('node_modules/.package-lock.json', installed('2.0.1'));
    expect(packagesState(root)).toBe('stale');
  });

  it('is stale when the lock file or a package.json changed after the stamp', () => {
    mkdirSync(path.join(root, 'node_modules'));
    put('node_modules/.package-lock.json', installed('2.0.0'));
    stampPackages(root);
    expect(packagesState(root)).toBe('fresh');
    put('package-lock.json', lockWith('2.1.0'));
    expect(packagesState(root)).toBe('stale');
    put('package-lock.json', lockWith('2.0.0'));
    expect(packagesState(root)).toBe('fresh');
    put('part/package.json', { dependencies: { helper: '^2.0.0', newcomer: '^1.0.0' } });
    expect(packagesState(root)).toBe('stale');
  });
});
