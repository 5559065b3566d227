import { spawnSync } from 'node:child_process';
import path from 'node:path';
import type { ServerAccount } from './server-account';

export interface ToolResult {
  code: number;
  output: string;
}

/** Runs one of the server's programs under the server's account. */
export function runServerTool(
  binDir: string,
  name: string,
  args: string[],
  account: ServerAccount,
  options: { keepOutput?: boolean } = {},
): ToolResult {
  const result = spawnSync(path.join(binDir, name), args, {
    // The account may not be able to enter the folder we are in.
    cwd: '/',
    env: { PATH: process.env.PATH ?? '', LC_ALL: 'C.UTF-8' },
    encoding: 'utf8',
    // pg_ctl start hands its output to the server, and a pipe would be waited for as long as the server runs.
    stdio: options.keepOutput === false ? 'ignore' : ['ignore', 'pipe', 'pipe'],
    ...(account.isOther ? { uid: account.uid, gid: account.gid } : {}),
  });
  if (result.error) throw result.error;
  return { code: result.status ?? 1, output: `${result.stdout ?? ''}${result.stderr ?? ''}`.trim() };
}
