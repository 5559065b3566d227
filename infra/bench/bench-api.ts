import pg from 'pg';
import type { BenchClinic } from './fill-clinic';
import { storePoint } from './fill-clinic';
import { load, type LoadResult } from './load';
import type { BenchRow } from './table';

const ms = (value: number) => `${value.toFixed(2)} ms`;
const measures = 'fev1,fvc,fev1fvc,tlc,sixMinuteWalkDistance,cat';
const rounds = 5;

interface Target {
  base: string;
  databaseUrl: string;
  clinic: BenchClinic;
}

/** The trend endpoint beside a handler that returns the same rows, a new point stored before every request. */
export async function benchTrends(target: Target): Promise<BenchRow[]> {
  const { base, clinic } = target;
  const pool = new pg.Pool({ connectionString: target.databaseUrl, max: 4 });
  const paths = {
    trends: `${base}/api/patients/${clinic.patientId}/trends?measures=${measures}`,
    bare: `${base}/api/bench/patients/${clinic.patientId}/rows`,
  };
  const rows: BenchRow[] = [];
  let stored = 0;
  const before = async () => {
    stored += 1;
    // it takes the place and day of another one, so that the series keeps its 40 points on 40 days
    const { rows: replaced } = await pool.query<{ takenAt: Date }>(
      `update measurements set voided_at = now(), voided_by = recorded_by, void_reason = 'duplicate'
       where id = (select id from measurements where patient_id = $1 and measure = 'cat' and voided_at is null
         order by taken_at offset $2 limit 1 for update skip locked) returning taken_at as "takenAt"`,
      [clinic.patientId, stored % 40],
    );
    for (const { takenAt } of replaced) await storePoint(pool, clinic, 'cat', takenAt);
  };
  for (const clients of [1, 8, 32]) {
    const run = (path: string) =>
      load({ url: () => path, cookie: clinic.cookie, clients, requests: clients === 1 ? 60 : 160, before });
    await run(paths.trends);
    await run(paths.bare);
    const measured: { trends: LoadResult[]; bare: LoadResult[] } = { trends: [], bare: [] };
    for (let round = 0; round < rounds; round += 1) {
      measured.trends.push(await run(paths.trends));
      measured.bare.push(await run(paths.bare));
    }
    const trends = middle(measured.trends);
    const bare = middle(measured.bare);
    const ratio = trends.medianMs / bare.medianMs;
    rows.push({
      what: `trend endpoint, ${clients} client${clients === 1 ? '' : 's'}`,
      measured: `${ms(trends.medianMs)} median, p95 ${ms(trends.p95Ms)}`,
      reference: `${ms(bare.medianMs)} same SQL, bare driver`,
      ratio,
      aim: clients === 8 ? 'at most 1.5, p95 < 150 ms' : 'at most 1.5',
      met: ratio <= 1.5 && (clients !== 8 || trends.p95Ms < 150),
    });
  }
  await pool.end();
  return rows;
}

/** The same searches in a clinic of 1,000 and in one of 50,000 patients. */
export async function benchSearch(small: Target, large: Target): Promise<BenchRow[]> {
  const words = ['ba', 'kami', 'le', 'tivo', 'ra se', 'nopu', '417', 'wu', 'gohu de', '1955-03-10'];
  const url = (target: Target) => (request: number) =>
    `${target.base}/api/patients?search=${encodeURIComponent(words[request % words.length]!)}`;
  const run = (target: Target, clients: number) =>
    load({ url: url(target), cookie: target.clinic.cookie, clients, requests: clients === 1 ? 100 : 200 });
  const rows: BenchRow[] = [];
  for (const clients of [1, 8]) {
    await run(small, clients);
    await run(large, clients);
    const measured: { small: LoadResult[]; large: LoadResult[] } = { small: [], large: [] };
    for (let round = 0; round < rounds; round += 1) {
      measured.small.push(await run(small, clients));
      measured.large.push(await run(large, clients));
    }
    const [at1000, at50000] = [middle(measured.small), middle(measured.large)];
    const ratio = at50000.medianMs / at1000.medianMs;
    rows.push({
      what: `patient search, 50,000 patients, ${clients} client${clients === 1 ? '' : 's'}`,
      measured: `${ms(at50000.medianMs)} median, p95 ${ms(at50000.p95Ms)}`,
      reference: `${ms(at1000.medianMs)} at 1,000 patients`,
      ratio,
      aim: clients === 8 ? 'at most 2, p95 < 150 ms' : 'at most 2',
      met: ratio <= 2 && (clients !== 8 || at50000.p95Ms < 150),
    });
  }
  return rows;
}

/** The round in the middle, so that one disturbed round does not decide. */
function middle(results: LoadResult[]): LoadResult {
  const sorted = [...results].sort((a, b) => a.medianMs - b.medianMs);
  return sorted[Math.floor(sorted.length / 2)]!;
}
