import { build } from 'esbuild';
import type { Plugin } from 'esbuild';
import { mkdirSync, renameSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import { projectRoot } from '../lib/project-paths';

/** File that runs the API. */
export const apiEntry = path.join(projectRoot, 'api', 'dist', 'main.js');

/** Packages stay outside the bundle; the other workspaces, which are TypeScript, go in. */
const workspacesInside: Plugin = {
  name: 'workspaces-inside',
  setup(context) {
    const require = createRequire(path.join(projectRoot, 'api', 'package.json'));
    context.onResolve({ filter: /^@slighthill\// }, ({ path: name }) => ({ path: require.resolve(name) }));
  },
};

/** Bundles the API: a few milliseconds, and it starts in half the time it needs from TypeScript. */
export async function bundleApi(): Promise<void> {
  await bundle(path.join(projectRoot, 'api', 'src', 'main.ts'), apiEntry);
}

/** Bundles one entry file for Node. */
export async function bundle(entry: string, outfile: string): Promise<void> {
  const { outputFiles } = await build({
    entryPoints: [entry],
    outfile,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    packages: 'external',
    sourcemap: true,
    logLevel: 'warning',
    plugins: [workspacesInside],
    write: false,
  });
  mkdirSync(path.dirname(apiEntry), { recursive: true });
  for (const file of outputFiles) {
    // Renamed into place: two commands may bundle at once, and none may read half a file.
    const unfinished = `${file.path}.${process.pid}`;
    writeFileSync(unfinished, file.contents);
    renameSync(unfinished, file.path);
  }
}
