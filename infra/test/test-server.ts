import { ensureCluster } from '../postgres/ensure-cluster';

export interface TestServer {
  /** Address of the maintenance database of a server made for tests. */
  serverUrl: string;
  stop(): Promise<void>;
}

/** Address of another database on the same server. */
export function withDatabase(url: string, database: string): string {
  const changed = new URL(url);
  changed.pathname = `/${database}`;
  return changed.href;
}

/** The server a test run was given, or a throw-away one of its own. */
export async function testServer(): Promise<TestServer> {
  const given = process.env.TEST_DATABASE_URL;
  if (given) return { serverUrl: given, stop: async () => undefined };
  const cluster = await ensureCluster({ dataDir: '', throwAway: true });
  return { serverUrl: withDatabase(cluster.url, 'postgres'), stop: () => cluster.stop() };
}
