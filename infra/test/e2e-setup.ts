import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { Client } from 'pg';
import type { TestProject } from 'vitest/node';
import { bundleApi } from '../build/bundle-api';
import { buildWeb, webDist } from '../build/build-web';
import { findFreePort } from '../lib/ports';
import { startApi } from '../start/api-process';
import { prepareDatabase } from '../start/prepare-database';
import { ensureChromium } from './ensure-chromium';
import './provided';
import { testServer, withDatabase } from './test-server';

async function createDatabase(serverUrl: string, name: string): Promise<string> {
  const client = new Client({ connectionString: serverUrl });
  await client.connect();
  try {
    await client.query(`create database ${name}`);
  } finally {
    await client.end();
  }
  return withDatabase(serverUrl, name);
}

/** Runs the product as `npm start` does, with the demo clinic, on a database and a port of its own. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  process.env.CHROMIUM_PATH = await ensureChromium();
  const server = await testServer();
  const logDir = mkdtempSync(path.join(os.tmpdir(), 'slighthill-e2e-'));
  try {
    const databaseUrl = await createDatabase(server.serverUrl, `slighthill_e2e_${process.pid}`);
    await prepareDatabase(databaseUrl, { demo: true });
    await buildWeb();
    await bundleApi();
    const port = await findFreePort();
    const api = await startApi({
      port,
      logDir,
      env: { DATABASE_URL: databaseUrl, WEB_DIST: webDist, NODE_ENV: 'development' },
    });
    project.provide('product', {
      baseUrl: `http://127.0.0.1:${port}`,
      databaseUrl,
      chromium: process.env.CHROMIUM_PATH,
    });
    return async () => {
      await api.stop();
      await server.stop();
      rmSync(logDir, { recursive: true, force: true });
    };
  } catch (error) {
    await server.stop();
    throw error;
  }
}
