import { connectDatabase } from '@slighthill/api/db/connect';
import { migrate } from '@slighthill/api/migrations/migrate';
import { step } from '../lib/progress';

/** The demo clinic is wanted unless it is switched off; with real data around it has no place. */
export function isDemoWanted(): boolean {
  return process.env.DEMO !== '0' && process.env.NODE_ENV !== 'production';
}

/** Brings the tables up to date and loads the demo clinic into an empty database. */
export async function prepareDatabase(url: string, options: { demo: boolean }): Promise<void> {
  const sequelize = connectDatabase(url);
  try {
    await step('Tables', () => migrate(sequelize));
    if (!options.demo) return;
    // Loaded only where it is wanted: the generator brings every service with it.
    const { isDatabaseEmpty, seedDemo } = await import('../demo/seed');
    if (await isDatabaseEmpty(sequelize)) await step('Loading the demo clinic', () => seedDemo(sequelize));
  } finally {
    await sequelize.close();
  }
}
