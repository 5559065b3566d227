import { runMain } from '../lib/run-main';
import { withDatabase } from './with-database';

await runMain(() =>
  withDatabase(async (_sequelize, applied) => {
    console.log(applied.length === 0 ? 'The tables are up to date.' : `Applied: ${applied.join(', ')}.`);
  }),
);
