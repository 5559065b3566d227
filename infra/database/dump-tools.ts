import path from 'node:path';
import { runCommand } from '../lib/run-command';
import { UserError } from '../lib/user-error';

/** Runs pg_dump or pg_restore; the password travels in the environment, where the list of processes does not show it. */
async function runDumpTool(binDir: string, name: string, url: string | null, args: string[]): Promise<string> {
  const env: Record<string, string | undefined> = { ...process.env };
  const connection: string[] = [];
  if (url) {
    const address = new URL(url);
    env.PGPASSWORD = decodeURIComponent(address.password);
    address.password = '';
    connection.push(`--dbname=${address.href}`);
  }
  const result = await runCommand(path.join(binDir, name), [...connection, ...args], { env });
  if (result.code !== 0) throw new UserError(`${name} failed:\n${result.output.trim()}`);
  return result.output;
}

export async function dumpDatabase(binDir: string, url: string, file: string): Promise<void> {
  await runDumpTool(binDir, 'pg_dump', url, ['--format=custom', '--no-owner', '--no-privileges', `--file=${file}`]);
}

/** Tables of a dump whose data can be read back. */
export async function tablesInDump(binDir: string, file: string): Promise<string[]> {
  const listing = await runDumpTool(binDir, 'pg_restore', null, ['--list', file]);
  // Reads every block of the file, so that a cut-off one is noticed now and not on the day it is needed.
  await runDumpTool(binDir, 'pg_restore', null, ['--file=/dev/null', file]);
  return [...listing.matchAll(/ TABLE DATA \S+ (\S+) /g)].map((match) => match[1] ?? '');
}

export async function restoreDump(binDir: string, url: string, file: string): Promise<void> {
  await runDumpTool(binDir, 'pg_restore', url, [
    '--no-owner',
    '--no-privileges',
    '--exit-on-error',
    '--single-transaction',
    file,
  ]);
}
