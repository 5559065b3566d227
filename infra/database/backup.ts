import { mkdirSync, renameSync, rmSync, statSync } from 'node:fs';
import path from 'node:path';
import { dataDir, pathFromUser } from '../lib/project-paths';
import { step } from '../lib/progress';
import { runMain } from '../lib/run-main';
import { UserError } from '../lib/user-error';
import { dumpDatabase, tablesInDump } from './dump-tools';
import { withServer } from './with-database';

function backupFile(): string {
  const named = process.argv[2];
  if (named) return pathFromUser(named);
  const folder = path.join(dataDir, 'backups');
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const time = new Date().toISOString().replace(/[:.]/g, '-');
  return path.join(folder, `${time}.dump`);
}

await runMain(() =>
  withServer(async (database) => {
    const binDir = await database.binDir();
    const file = backupFile();
    const unfinished = `${file}.unfinished`;
    // Patients' data: readable by this account alone.
    process.umask(0o077);
    try {
      await step('Writing the backup', () => dumpDatabase(binDir, database.url, unfinished));
      const tables = await step('Reading it back', () => tablesInDump(binDir, unfinished));
      if (!tables.includes('clinics'))
        throw new UserError('The database has no tables of Slighthill yet; no backup was made.');
      renameSync(unfinished, file);
      console.log(`Backup of ${tables.length} tables, ${Math.ceil(statSync(file).size / 1024)} kB: ${file}`);
    } finally {
      rmSync(unfinished, { force: true });
    }
  }),
);
