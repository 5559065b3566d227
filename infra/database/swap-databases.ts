import { Client } from 'pg';
import { UserError } from '../lib/user-error';

function otherDatabase(url: string, name: string): string {
  const address = new URL(url);
  address.pathname = `/${name}`;
  return address.href;
}

const quoted = (name: string) => `"${name.replaceAll('"', '""')}"`;

/** Runs statements on the same server, outside the product's database. */
async function onServer(url: string, statements: string[]): Promise<void> {
  const client = new Client({ connectionString: otherDatabase(url, 'postgres') });
  await client.connect();
  try {
    for (const statement of statements) await client.query(statement);
  } finally {
    await client.end();
  }
}

/**
 * Fills a new database and puts it in the place of the product's; the former one stays under another name, returned
 * here. Until the two renames nothing the product sees has changed.
 */
export async function replaceDatabase(
  url: string,
  now: Date,
  fill: (newUrl: string) => Promise<void>,
): Promise<string> {
  const current = decodeURIComponent(new URL(url).pathname.slice(1));
  const stamp = now.toISOString().replace(/\D/g, '').slice(0, 14);
  const incoming = `${current}_restoring_${stamp}`;
  const former = `${current}_before_${stamp}`;
  await onServer(url, [`create database ${quoted(incoming)}`]);
  try {
    await fill(otherDatabase(url, incoming));
    await onServer(url, [`alter database ${quoted(current)} rename to ${quoted(former)}`]);
  } catch (error) {
    await onServer(url, [`drop database if exists ${quoted(incoming)} with (force)`]);
    const inUse = error instanceof Error && 'code' in error && error.code === '55006';
    if (inUse)
      throw new UserError('Another program works with the database. End it, then restore. Nothing was changed.');
    throw error;
  }
  try {
    await onServer(url, [`alter database ${quoted(incoming)} rename to ${quoted(current)}`]);
  } catch (error) {
    await onServer(url, [`alter database ${quoted(former)} rename to ${quoted(current)}`]);
    throw error;
  }
  return former;
}
