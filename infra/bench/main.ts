import { connectDatabase } from '@slighthill/api/db/connect';
import { migrate } from '@slighthill/api/migrations/migrate';
import pg from 'pg';
import { buildWeb } from '../build/build-web';
import { bundle } from '../build/bundle-api';
import { step } from '../lib/progress';
import { projectRoot } from '../lib/project-paths';
import { runMain } from '../lib/run-main';
import { ensureCluster } from '../postgres/ensure-cluster';
import { ensureChromium } from '../test/ensure-chromium';
import path from 'node:path';
import { benchSearch, benchTrends } from './bench-api';
import { benchPages } from './bench-pages';
import { benchPredictions } from './bench-predictions';
import { benchEntry, startBenchServer, type BenchServer } from './bench-server';
import { fillClinic } from './fill-clinic';
import { printTable, type BenchRow } from './table';

const limitMb = 250;

/** Measures against a reference in the same run: ratios travel between machines, times do not. */
async function main(): Promise<number> {
  const chromium = await ensureChromium();
  await buildWeb();
  await bundle(path.join(projectRoot, 'infra', 'bench', 'server.ts'), benchEntry);
  const cluster = await ensureCluster({ dataDir: '', throwAway: true });
  const servers: BenchServer[] = [];
  try {
    const make = async (database: string, patients: number) => {
      const databaseUrl = await makeDatabase(cluster.url, database);
      const client = new pg.Client({ connectionString: databaseUrl });
      await client.connect();
      const clinic = await fillClinic(client, patients);
      await client.end();
      const server = await startBenchServer(databaseUrl);
      servers.push(server);
      return { base: server.base, databaseUrl, clinic, server };
    };
    const small = await step('Filling a clinic of 1,000 patients', () => make('bench_small', 1_000));
    const large = await step('Filling a clinic of 50,000 patients', () => make('bench_large', 50_000));
    const beforeMb = large.server.residentMb();
    const rows: BenchRow[] = [];
    rows.push(...(await step('Predictions', () => benchPredictions())));
    rows.push(...(await step('Trends', () => benchTrends(large))));
    rows.push(...(await step('Search', () => benchSearch(small, large))));
    rows.push(...(await step('Pages', () => benchPages(chromium, large.base, large.clinic))));
    const afterMb = large.server.residentMb();
    rows.push({
      what: 'resident memory of the API after the bench',
      measured: `${afterMb.toFixed(0)} MB`,
      reference: `${beforeMb.toFixed(0)} MB before`,
      ratio: afterMb / beforeMb,
      aim: `under ${limitMb} MB`,
      met: afterMb < limitMb,
    });
    printTable('Slighthill bench', rows);
    const missed = rows.filter((row) => !row.met).length;
    console.log(`\n${rows.length - missed} of ${rows.length} aims met.`);
    return 0;
  } finally {
    for (const server of servers) await server.stop();
    await cluster.stop();
  }
}

async function makeDatabase(clusterUrl: string, name: string): Promise<string> {
  const client = new pg.Client({ connectionString: clusterUrl });
  await client.connect();
  await client.query(`create database ${name}`);
  await client.end();
  const url = new URL(clusterUrl);
  url.pathname = `/${name}`;
  const sequelize = connectDatabase(url.href);
  await migrate(sequelize);
  await sequelize.close();
  return url.href;
}

void runMain(main);
