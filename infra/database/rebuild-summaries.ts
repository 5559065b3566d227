import { rebuildEnrollmentSummaries } from '@slighthill/api/services/rebuild-enrollment-summaries';
import { runMain } from '../lib/run-main';
import { withDatabase } from './with-database';

await runMain(() =>
  withDatabase(async (sequelize) => {
    const { rebuilt, differed } = await rebuildEnrollmentSummaries(sequelize);
    console.log(`${rebuilt} summaries rebuilt, ${differed} of them differed.`);
  }),
);
