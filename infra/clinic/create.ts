import { AppError } from '@slighthill/api/errors/app-error';
import { createClinic } from '@slighthill/api/services/create-clinic';
import { withDatabase } from '../database/with-database';
import { readPort } from '../lib/read-port';
import { runMain } from '../lib/run-main';
import { UserError } from '../lib/user-error';
import { readClinicOptions } from './read-clinic-options';
import type { ClinicOptions } from './read-clinic-options';

async function create(options: ClinicOptions) {
  try {
    return await createClinic(options, { clock: { now: () => new Date() } });
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    const fields = (error.errors ?? [])
      .filter(({ message }) => !error.message.includes(message))
      .map(({ path, message }) => `  ${path}: ${message}`);
    throw new UserError([error.message, ...fields].join('\n'));
  }
}

await runMain(async () => {
  const options = readClinicOptions(process.argv.slice(2));
  const port = readPort('PORT', 4310);
  await withDatabase(async () => {
    const { invitationToken, expiresAt } = await create(options);
    const until = new Date(expiresAt).toLocaleString('en-US', {
      timeZone: options.timeZone,
      dateStyle: 'long',
      timeStyle: 'short',
    });
    console.log(
      `The clinic "${options.name}" exists. Its administrator, ${options.adminEmail}, chooses a password here:`,
    );
    console.log(`\n  http://127.0.0.1:${port}/welcome#${invitationToken}\n`);
    console.log(
      `The link works once, until ${until} (${options.timeZone}). Start the product with npm start to open it.`,
    );
  });
});
