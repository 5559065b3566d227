/**
 * Entry of every `npm run` command: checks Node, brings the packages up to date, then runs the command's TypeScript in
 * this same process, so that signals and the exit code need no forwarding. Uses Node's own modules only: at this point
 * nothing else may be installed.
 */
import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { packagesState, stampPackages } from './install/packages-state.mjs';

const projectRoot = path.resolve(import.meta.dirname, '..');

/** @type {Record<string, string>} */
const commands = {
  start: 'start/main.ts',
  test: 'test/main.ts',
  dev: 'dev/main.ts',
  bench: 'bench/main.ts',
  'clinic:create': 'clinic/create.ts',
  'db:migrate': 'database/migrate.ts',
  'db:seed': 'database/seed.ts',
  'db:backup': 'database/backup.ts',
  'db:restore': 'database/restore.ts',
  'summaries:rebuild': 'database/rebuild-summaries.ts',
};

/** @param {string} message @returns {never} */
function fail(message) {
  console.error(message);
  process.exit(1);
}

function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) {
    fail(`Slighthill needs Node 20.19 or newer; this is ${process.versions.node}.`);
  }
}

function bringPackagesUpToDate() {
  const state = packagesState(projectRoot);
  if (state === 'fresh') return;
  const startedAt = Date.now();
  console.log(state === 'missing' ? 'Installing packages …' : 'Packages changed; installing them again …');
  const npmCli = process.env.npm_execpath;
  // With NODE_ENV=production npm leaves out what the commands themselves run on: tsx, vite, esbuild.
  const flags = ['ci', '--include=dev', '--no-audit', '--no-fund', '--prefer-offline'];
  const result = npmCli?.endsWith('.js')
    ? spawnSync(process.execPath, [npmCli, ...flags], { cwd: projectRoot, stdio: 'inherit' })
    : spawnSync('npm', flags, { cwd: projectRoot, stdio: 'inherit' });
  if (result.status !== 0) {
    fail('Packages could not be installed; npm said why above. Nothing else was changed. Run the command again.');
  }
  stampPackages(projectRoot);
  console.log(`Packages installed (${Math.round((Date.now() - startedAt) / 1000)} s).`);
}

checkNode();
const [name = '', ...args] = process.argv.slice(2);
const script = commands[name];
if (!script) fail(`Unknown command "${name}". Known: ${Object.keys(commands).join(', ')}.`);
process.chdir(projectRoot);
bringPackagesUpToDate();
process.argv = [process.argv[0] ?? process.execPath, path.join(import.meta.dirname, script), ...args];
const { register } = await import('tsx/esm/api');
register();
await import(pathToFileURL(path.join(import.meta.dirname, script)).href);
