import { mkdirSync, writeFileSync } from 'node:fs';
import { aptInstall } from '../lib/apt-install';
import { UserError } from '../lib/user-error';
import { findBinaries } from './find-binaries';

// Without this Debian's package makes and starts a cluster of its own on the default port.
const policyDir = '/etc/postgresql-common/createcluster.d';
const policyFile = `${policyDir}/no-main.conf`;
const policy = 'create_main_cluster = false';

const commandToShow = [
  `sudo mkdir -p ${policyDir}`,
  `echo '${policy}' | sudo tee ${policyFile}`,
  'sudo apt-get install -y --no-install-recommends postgresql',
].join(' && ');

/** Folder of the server's programs, installing Debian's package when there is none. */
export async function ensureBinaries(clusterDir?: string): Promise<string> {
  const found = findBinaries(clusterDir);
  if (found) return found;
  if (clusterDir && findBinaries()) {
    throw new UserError(
      `The cluster in ${clusterDir} was made by another major version of PostgreSQL than those installed. Install that version, or use a server of your own with DATABASE_URL.`,
    );
  }
  if (process.getuid?.() === 0) {
    mkdirSync(policyDir, { recursive: true });
    writeFileSync(policyFile, `${policy}\n`);
  }
  await aptInstall('PostgreSQL', 'postgresql', commandToShow);
  const installed = findBinaries();
  if (!installed)
    throw new UserError(
      'PostgreSQL was installed, but its programs were not found. Name their folder in POSTGRES_BIN.',
    );
  return installed;
}
