import { connectDatabase } from '@slighthill/api/db/connect';
import { migrate } from '@slighthill/api/migrations/migrate';
import type { Sequelize } from 'sequelize';
import { dataDir } from '../lib/project-paths';
import { whoIsRunning } from '../lib/running-lock';
import { ensureDatabase } from '../postgres/ensure-database';
import type { ProductDatabase } from '../postgres/ensure-database';

/** Work with the product's database; a server started for it is stopped again unless the product has come to use it. */
export async function withServer<T>(work: (database: ProductDatabase) => Promise<T>): Promise<T> {
  const database = await ensureDatabase(dataDir);
  try {
    return await work(database);
  } finally {
    const user = whoIsRunning(dataDir);
    if (database.started && (!user || user.owner.pid === process.pid)) await database.stop();
  }
}

/** The same with an open connection and tables up to date. */
export async function withDatabase<T>(work: (sequelize: Sequelize, applied: string[]) => Promise<T>): Promise<T> {
  return withServer(async ({ url }) => {
    const sequelize = connectDatabase(url);
    try {
      return await work(sequelize, await migrate(sequelize));
    } finally {
      await sequelize.close();
    }
  });
}
