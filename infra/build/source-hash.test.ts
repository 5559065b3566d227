import { mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { sourceHash } from './source-hash';

let root: string;
const put = (name: string, text: string) => {
  mkdirSync(path.dirname(path.join(root, name)), { recursive: true });
  writeFileSync(path.join(root, name), text);
};
const hash = () => sourceHash(root, ['web', 'lock.json']);

beforeEach(() => {
  root = mkdtempSync(path.join(os.tmpdir(), 'slighthill-hash-'));
  put('web/src/a.ts', 'one');
  put('web/src/deep/b.ts', 'two');
  put('lock.json', '{}');
});

afterEach(() => rmSync(root, { recursive: true, force: true }));

it('stays equal when only results of a build appear', () => {
  const before = hash();
  put('web/dist/index.html', 'built');
  put('web/node_modules/.vite/cache', 'cache');
  put('elsewhere/c.ts', 'not ours');
  expect(hash()).toBe(before);
});

it.each([
  ['a changed file', () => put('web/src/a.ts', 'One')],
  ['a new file', () => put('web/src/c.ts', '')],
  ['a new name', () => renameSync(path.join(root, 'web/src/a.ts'), path.join(root, 'web/src/z.ts'))],
  ['the lock file', () => put('lock.json', '{ }')],
  ['text moved over a file border', () => (put('web/src/a.ts', 'onet'), put('web/src/deep/b.ts', 'wo'))],
])('changes with %s', (_what, change) => {
  const before = hash();
  change();
  expect(hash()).not.toBe(before);
});
