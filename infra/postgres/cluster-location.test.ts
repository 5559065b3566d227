import { chmodSync, mkdirSync, mkdtempSync, rmSync, statSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { canEnter, isOurBase, makeClusterBase, newClusterBase } from './cluster-location';
import type { ServerAccount } from './server-account';

let folder: string;
let dataDir: string;
const me: ServerAccount = { uid: process.getuid?.() ?? 0, gid: process.getgid?.() ?? 0, isOther: false };
// An account that owns nothing here, as "postgres" does not own a home folder.
const stranger: ServerAccount = { uid: 65_533, gid: 65_533, isOther: true };

beforeEach(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'slighthill-location-'));
  chmodSync(folder, 0o755);
  dataDir = path.join(folder, 'project', '.data');
  mkdirSync(dataDir, { recursive: true });
});

afterEach(() => {
  rmSync(folder, { recursive: true, force: true });
});

describe('canEnter', () => {
  it('is stopped by a closed folder anywhere above', () => {
    expect(canEnter(dataDir, stranger)).toBe(true);
    chmodSync(folder, 0o700);
    expect(canEnter(dataDir, stranger)).toBe(false);
    expect(canEnter(dataDir, me)).toBe(true);
  });
});

describe('makeClusterBase', () => {
  it('lies under the data folder, closed to others, without closing the folders above', () => {
    const base = makeClusterBase(dataDir, me);
    expect(path.dirname(base)).toBe(dataDir);
    expect(statSync(base).mode & 0o777).toBe(0o700);
    expect(statSync(dataDir).mode & 0o005).toBe(0o005);
    expect(isOurBase(base, me)).toBe(true);
  });

  it('lies in the temporary area where the account cannot reach the project', () => {
    chmodSync(folder, 0o700);
    expect(newClusterBase(dataDir, stranger)).toMatch(/^\/var\/tmp\/slighthill-[0-9a-f]{12}-[0-9a-f]{8}$/);
    expect(path.dirname(newClusterBase(dataDir, me))).toBe(dataDir);
  });

  it('gives every cluster a new name and takes no folder for ours that others can open', () => {
    const base = makeClusterBase(dataDir, me);
    expect(makeClusterBase(dataDir, me)).not.toBe(base);
    chmodSync(base, 0o755);
    expect(isOurBase(base, me)).toBe(false);
    expect(isOurBase(path.join(dataDir, 'absent'), me)).toBe(false);
  });
});
