import { existsSync } from 'node:fs';
import path from 'node:path';
import { aptInstall } from '../lib/apt-install';
import { UserError } from '../lib/user-error';

const names = ['chromium', 'chromium-browser'];

function findChromium(): string | null {
  const own = process.env.CHROMIUM_PATH;
  if (own) {
    if (existsSync(own)) return own;
    throw new UserError(`CHROMIUM_PATH names ${own}, which does not exist.`);
  }
  const dirs = ['/usr/bin', ...(process.env.PATH ?? '').split(path.delimiter).filter(Boolean)];
  return names.flatMap((name) => dirs.map((dir) => path.join(dir, name))).find((file) => existsSync(file)) ?? null;
}

/** The browser of the browser tests: the one there is, or Debian's package. */
export async function ensureChromium(): Promise<string> {
  const found = findChromium();
  if (found) return found;
  await aptInstall('Chromium', 'chromium', 'sudo apt-get install -y --no-install-recommends chromium');
  const installed = findChromium();
  if (!installed) throw new UserError('Chromium was installed but not found. Name its program in CHROMIUM_PATH.');
  return installed;
}
