import { connectDatabase } from '@slighthill/api/db/connect';
import { migrate } from '@slighthill/api/migrations/migrate';
import { Client } from 'pg';
import type { TestProject } from 'vitest/node';
import './provided';
import { testServer, withDatabase } from './test-server';

async function onServer(serverUrl: string, ...statements: string[]): Promise<void> {
  const client = new Client({ connectionString: serverUrl });
  await client.connect();
  try {
    for (const statement of statements) await client.query(statement);
  } finally {
    await client.end();
  }
}

async function dropCopies(serverUrl: string, template: string): Promise<void> {
  const client = new Client({ connectionString: serverUrl });
  await client.connect();
  try {
    await client.query(`alter database ${template} with is_template false`);
    const copies = await client.query<{ datname: string }>(
      'select datname from pg_database where starts_with(datname, $1)',
      [template],
    );
    for (const { datname } of copies.rows) await client.query(`drop database if exists ${datname} with (force)`);
  } finally {
    await client.end();
  }
}

/** Migrates one database; each test worker copies it, which takes a tenth of a second. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const server = await testServer();
  const template = `slighthill_test_${project.name}_${process.pid}`;
  try {
    await onServer(server.serverUrl, `create database ${template}`);
    const sequelize = connectDatabase(withDatabase(server.serverUrl, template));
    try {
      await migrate(sequelize);
    } finally {
      await sequelize.close();
    }
    await onServer(server.serverUrl, `alter database ${template} with is_template true allow_connections false`);
  } catch (error) {
    await server.stop();
    throw error;
  }
  project.provide('testDatabase', { serverUrl: server.serverUrl, template });
  return async () => {
    await dropCopies(server.serverUrl, template);
    await server.stop();
  };
}
