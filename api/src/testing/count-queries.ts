import type { TestServer } from './server';

/** Runs the work and returns the statements it sent to the database. */
export async function queriesOf(server: TestServer, work: () => Promise<unknown>): Promise<string[]> {
  const statements: string[] = [];
  const { options } = server.sequelize as unknown as { options: { logging: false | ((sql: string) => void) } };
  options.logging = (sql) => statements.push(sql);
  try {
    await work();
  } finally {
    options.logging = false;
  }
  return statements;
}
