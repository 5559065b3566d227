import { parseArgs } from 'node:util';
import { UserError } from '../lib/user-error';

export interface ClinicOptions {
  name: string;
  timeZone: string;
  adminEmail: string;
  adminName: string;
}

const usage =
  'Usage: npm run clinic:create -- --name "Clinic name" --zone America/Chicago --admin-email someone@clinic.example [--admin-name "Full name"]';

function isTimeZone(zone: string): boolean {
  try {
    // Names of places know about summer time; an abbreviation or an offset does not.
    new Intl.DateTimeFormat('en', { timeZone: zone });
    return zone.includes('/') || zone === 'UTC';
  } catch {
    return false;
  }
}

function parse(args: string[]) {
  try {
    const option = { type: 'string' } as const;
    return parseArgs({ args, options: { name: option, zone: option, 'admin-email': option, 'admin-name': option } })
      .values;
  } catch (error) {
    throw new UserError(`${error instanceof Error ? error.message : String(error)}\n${usage}`);
  }
}

/** What a new clinic needs, from the command line. Every problem is named at once. */
export function readClinicOptions(args: string[]): ClinicOptions {
  const values = parse(args);
  const name = values.name?.trim() ?? '';
  const timeZone = values.zone?.trim() ?? '';
  const adminEmail = values['admin-email']?.trim().toLowerCase() ?? '';
  const problems: string[] = [];
  if (!name) problems.push('--name is missing.');
  if (!timeZone) problems.push('--zone is missing.');
  else if (!isTimeZone(timeZone)) problems.push(`--zone "${timeZone}" is not a time zone. Example: America/Chicago.`);
  if (!/^[^\s@]+@[^\s@]+\.[^\s@]+$/.test(adminEmail))
    problems.push('--admin-email is missing or not an e-mail address.');
  if (problems.length > 0) throw new UserError(`${problems.join('\n')}\n${usage}`);
  return { name, timeZone, adminEmail, adminName: values['admin-name']?.trim() || 'Administrator' };
}
