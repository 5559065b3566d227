import { spawnSync } from 'node:child_process';
import { chownSync } from 'node:fs';
import { UserError } from '../lib/user-error';

/** The account the server runs under: PostgreSQL refuses to run as root. */
export interface ServerAccount {
  uid: number;
  gid: number;
  /** True when this process must hand its files over and drop its rights for every server program. */
  isOther: boolean;
}

function idOf(flag: '-u' | '-g'): number {
  const result = spawnSync('id', [flag, 'postgres'], { encoding: 'utf8' });
  const id = Number(result.stdout?.trim());
  if (result.status !== 0 || !Number.isInteger(id)) {
    throw new UserError(
      'PostgreSQL cannot run as root, and there is no account "postgres" to run it. Create the account or start as an ordinary user.',
    );
  }
  return id;
}

export function serverAccount(): ServerAccount {
  const uid = process.getuid?.() ?? 0;
  if (uid !== 0) return { uid, gid: process.getgid?.() ?? 0, isOther: false };
  return { uid: idOf('-u'), gid: idOf('-g'), isOther: true };
}

/** Gives a file or folder to the account, where that is another one. */
export function handOver(file: string, account: ServerAccount): void {
  if (account.isOther) chownSync(file, account.uid, account.gid);
}
