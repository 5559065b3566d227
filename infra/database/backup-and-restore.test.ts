import { mkdtempSync, rmSync, truncateSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { Client } from 'pg';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, inject, it } from 'vitest';
import { findBinaries } from '../postgres/find-binaries';
import '../test/provided';
import { withDatabase } from '../test/test-server';
import { dumpDatabase, restoreDump, tablesInDump } from './dump-tools';
import { replaceDatabase } from './swap-databases';

const { serverUrl } = inject('testDatabase');
const binDir = findBinaries() ?? '';
const name = `backup_test_${process.pid}`;
const url = withDatabase(serverUrl, name);
let folder: string;
let file: string;

async function query(address: string, text: string): Promise<unknown[]> {
  const client = new Client({ connectionString: address });
  await client.connect();
  try {
    return (await client.query<Record<string, unknown>>(text)).rows;
  } finally {
    await client.end();
  }
}

beforeAll(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'slighthill-backup-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

beforeEach(async () => {
  file = path.join(folder, `${Date.now()}.dump`);
  await query(serverUrl, `create database ${name}`);
  await query(url, "create table walks as select 1 as id, 'Zoë' as who, 412 as meters");
});

afterEach(async () => {
  const left = (await query(serverUrl, `select datname from pg_database where starts_with(datname, '${name}')`)) as {
    datname: string;
  }[];
  for (const { datname } of left) await query(serverUrl, `drop database ${datname} with (force)`);
});

const restoreFile = () => replaceDatabase(url, new Date(), (newUrl) => restoreDump(binDir, newUrl, file));

describe('a backup', () => {
  it('brings back what was there and keeps what it replaced', async () => {
    await dumpDatabase(binDir, url, file);
    expect(await tablesInDump(binDir, file)).toEqual(['walks']);
    await query(url, 'update walks set meters = 0');
    const former = await restoreFile();
    expect(await query(url, 'select * from walks')).toEqual([{ id: 1, who: 'Zoë', meters: 412 }]);
    expect(await query(withDatabase(serverUrl, former), 'select meters from walks')).toEqual([{ meters: 0 }]);
  });

  it('that was cut off is refused and changes nothing', async () => {
    await query(url, 'insert into walks select n, repeat(md5(n::text), 20), n from generate_series(2, 2000) n');
    await dumpDatabase(binDir, url, file);
    truncateSync(file, 9_000);
    await expect(tablesInDump(binDir, file)).rejects.toThrow(/pg_restore failed/);
    await expect(restoreFile()).rejects.toThrow(/pg_restore failed/);
    expect(await query(url, 'select count(*)::int as n from walks')).toEqual([{ n: 2000 }]);
    expect(await query(serverUrl, `select datname from pg_database where starts_with(datname, '${name}')`)).toEqual([
      { datname: name },
    ]);
  });

  it('is not restored under a program that works with the database', async () => {
    await dumpDatabase(binDir, url, file);
    const other = new Client({ connectionString: url });
    await other.connect();
    try {
      await expect(restoreFile()).rejects.toThrow(/Another program works with the database/);
    } finally {
      await other.end();
    }
    expect(await query(url, 'select meters from walks')).toEqual([{ meters: 412 }]);
  });
});
