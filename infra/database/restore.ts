import { connectDatabase } from '@slighthill/api/db/connect';
import { migrate } from '@slighthill/api/migrations/migrate';
import { existsSync } from 'node:fs';
import { dataDir, pathFromUser } from '../lib/project-paths';
import { step } from '../lib/progress';
import { runMain } from '../lib/run-main';
import { takeRunningLock, whoIsRunning } from '../lib/running-lock';
import { UserError } from '../lib/user-error';
import { restoreDump, tablesInDump } from './dump-tools';
import { replaceDatabase } from './swap-databases';
import { withServer } from './with-database';

async function restore(file: string): Promise<void> {
  await withServer(async (database) => {
    const binDir = await database.binDir();
    const tables = await step('Reading the backup', () => tablesInDump(binDir, file));
    if (!tables.includes('clinics')) throw new UserError(`${file} is not a backup of Slighthill. Nothing was changed.`);
    const former = await replaceDatabase(database.url, new Date(), async (newUrl) => {
      await step('Restoring into a new database', () => restoreDump(binDir, newUrl, file));
      const sequelize = connectDatabase(newUrl);
      try {
        await step('Tables', () => migrate(sequelize));
      } finally {
        await sequelize.close();
      }
    });
    console.log(`Restored ${tables.length} tables. The data from before is kept in the database ${former}.`);
  });
}

await runMain(async () => {
  const named = process.argv[2];
  if (!named) throw new UserError('Name the backup: npm run db:restore -- <file>');
  const file = pathFromUser(named);
  if (!existsSync(file)) throw new UserError(`There is no file ${file}. Nothing was changed.`);
  const lock = takeRunningLock(dataDir, 'db:restore');
  if (!lock) {
    throw new UserError(
      `Slighthill is running from this folder (process ${whoIsRunning(dataDir)?.owner.pid ?? 'unknown'}). Stop it, then restore. Nothing was changed.`,
    );
  }
  try {
    await restore(file);
  } finally {
    lock.release();
  }
});
