import { isDatabaseEmpty, seedDemo } from '../demo/seed';
import { step } from '../lib/progress';
import { runMain } from '../lib/run-main';
import { UserError } from '../lib/user-error';
import { withDatabase } from './with-database';

await runMain(async () => {
  if (process.env.NODE_ENV === 'production')
    throw new UserError('The demo clinic is never loaded with NODE_ENV=production.');
  await withDatabase(async (sequelize) => {
    if (!(await isDatabaseEmpty(sequelize))) {
      console.log('The database is not empty; nothing was loaded.');
      return;
    }
    const { patients } = await step('Loading the demo clinic', () => seedDemo(sequelize));
    console.log(`The demo clinic is loaded, ${patients} patients.`);
  });
});
