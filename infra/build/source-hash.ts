import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, statSync } from 'node:fs';
import path from 'node:path';

const generated = new Set(['node_modules', 'dist', 'coverage']);

function filesBelow(entry: string): string[] {
  if (statSync(entry).isFile()) return [entry];
  return readdirSync(entry, { withFileTypes: true })
    .filter((child) => !generated.has(child.name))
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .flatMap((child) => filesBelow(path.join(entry, child.name)));
}

/** One value for the content of files and folders: equal as long as no name and no byte changes. */
export function sourceHash(root: string, entries: string[]): string {
  const hash = createHash('sha256').update(process.versions.node);
  for (const file of entries.flatMap((entry) => filesBelow(path.join(root, entry)))) {
    const content = readFileSync(file);
    hash.update(`\0${path.relative(root, file)}\0${content.length}\0`).update(content);
  }
  return hash.digest('hex');
}
