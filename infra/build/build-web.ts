import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { step } from '../lib/progress';
import { dataDir, projectRoot } from '../lib/project-paths';
import { runCommand } from '../lib/run-command';
import { UserError } from '../lib/user-error';
import { sourceHash } from './source-hash';

const sources = ['web', 'shared/src', 'shared/package.json', 'package-lock.json'];

/** Folder of the built web app. */
export const webDist = path.join(projectRoot, 'web', 'dist');
const stampFile = path.join(webDist, '.sources');

/** Puts a whole build in place of the former one, so that a running server never serves half of two. */
function swapIn(built: string): void {
  for (let attempt = 1; ; attempt++) {
    rmSync(webDist, { recursive: true, force: true });
    try {
      renameSync(built, webDist);
      return;
    } catch (error) {
      // Another command may have put its build there in between.
      if ((error as NodeJS.ErrnoException).code !== 'ENOTEMPTY' || attempt === 5) throw error;
    }
  }
}

async function viteBuild(signal?: AbortSignal): Promise<void> {
  const next = path.join(dataDir, `web-build-${process.pid}`);
  mkdirSync(dataDir, { recursive: true });
  try {
    const vite = path.join(projectRoot, 'node_modules', 'vite', 'bin', 'vite.js');
    const result = await runCommand(process.execPath, [vite, 'build', '--outDir', next, '--emptyOutDir'], {
      cwd: path.join(projectRoot, 'web'),
      env: { ...process.env, NODE_ENV: 'production' },
      ...(signal ? { signal } : {}),
    });
    if (result.code !== 0) throw new UserError(`The web app could not be built:\n${result.output.trim()}`);
    swapIn(next);
  } finally {
    rmSync(next, { recursive: true, force: true });
  }
}

/** Builds the web app unless the last build came from the same sources. */
export async function buildWeb(signal?: AbortSignal): Promise<void> {
  const hash = sourceHash(projectRoot, sources);
  if (existsSync(stampFile) && readFileSync(stampFile, 'utf8') === hash) return;
  await step('Building the web app', () => viteBuild(signal));
  writeFileSync(stampFile, hash);
}
