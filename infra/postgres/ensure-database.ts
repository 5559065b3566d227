import { step } from '../lib/progress';
import { ensureBinaries } from './install-postgres';
import { ensureCluster } from './ensure-cluster';

export interface ProductDatabase {
  url: string;
  started: boolean;
  /** Folder of pg_dump and others, found when first asked for. */
  binDir(): Promise<string>;
  stop(): Promise<void>;
}

/** The product's database: the server named by DATABASE_URL, or a private one of this folder. */
export async function ensureDatabase(dataDir: string): Promise<ProductDatabase> {
  const url = process.env.DATABASE_URL;
  if (url) return { url, started: false, binDir: () => ensureBinaries(), stop: async () => undefined };
  const cluster = await step('Database server', () => ensureCluster({ dataDir }));
  return { ...cluster, binDir: async () => cluster.binDir };
}
