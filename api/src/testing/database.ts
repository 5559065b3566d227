import { Client } from 'pg';
import { inject } from 'vitest';

interface TestDatabase {
  serverUrl: string;
  template: string;
}

declare module 'vitest' {
  export interface ProvidedContext {
    testDatabase: TestDatabase;
  }
}

let address: Promise<string> | undefined;

async function copyTemplate(): Promise<string> {
  const { serverUrl, template } = inject('testDatabase');
  const database = `${template}_w${process.env.VITEST_POOL_ID ?? '0'}`;
  const client = new Client({ connectionString: serverUrl });
  await client.connect();
  try {
    const found = await client.query('select 1 from pg_database where datname = $1', [database]);
    if (found.rowCount === 0) await client.query(`create database ${database} template ${template}`);
  } finally {
    await client.end();
  }
  const url = new URL(serverUrl);
  url.pathname = `/${database}`;
  return url.href;
}

/**
 * Address of this worker's own migrated database, copied from the template on first use. Files that run one after the
 * other in a worker share it: a test makes its own clinic and never empties a table.
 */
export function testDatabaseUrl(): Promise<string> {
  address ??= copyTemplate();
  return address;
}
