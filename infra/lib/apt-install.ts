import { existsSync } from 'node:fs';
import { step } from './progress';
import { runCommand } from './run-command';
import { UserError } from './user-error';

const aptGet = '/usr/bin/apt-get';

/** Installs one Debian package where this account may, and otherwise ends with the one command to run. */
export async function aptInstall(what: string, packageName: string, commandToShow: string): Promise<void> {
  if (process.getuid?.() !== 0 || !existsSync(aptGet)) {
    throw new UserError(
      `${what} is not installed, and this account may not install it. Run this once, then try again:\n\n  ${commandToShow}\n`,
    );
  }
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const install = () => runCommand(aptGet, ['install', '-y', '--no-install-recommends', packageName], { env });
  await step(`Installing ${what} (Debian package ${packageName})`, async () => {
    let result = await install();
    if (result.code !== 0) {
      // A fresh machine has no package lists yet.
      await runCommand(aptGet, ['update'], { env });
      result = await install();
    }
    if (result.code !== 0) {
      const tail = result.output.trim().split('\n').slice(-8).join('\n');
      throw new UserError(
        `${what} could not be installed:\n${tail}\n\nRun this once, then try again:\n\n  ${commandToShow}\n`,
      );
    }
  });
}
