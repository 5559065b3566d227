import { searchKey } from '@slighthill/shared/search-key';
import { randomUUID } from 'node:crypto';
import { col, fn, where } from 'sequelize';
import { inTransaction } from '../db/in-transaction';
import { AppError } from '../errors/app-error';
import { Clinic } from '../models/clinic';
import { User } from '../models/user';
import { clinicDate } from '../time/clinic-time';
import type { Clock } from './command-context';
import { issueInvitation } from './invitations';

export interface NewClinic {
  name: string;
  timeZone: string;
  adminEmail: string;
  adminName: string;
}

/** An empty clinic with one administrator, who gets a single-use link to choose a password. */
export async function createClinic(
  input: NewClinic,
  { clock }: { clock: Clock },
): Promise<{ clinicId: string; invitationToken: string; expiresAt: Date }> {
  const now = clock.now();
  checkZone(input.timeZone, now);
  return await inTransaction(async () => {
    await refuseKnownEmail(input.adminEmail);
    const clinic = await Clinic.create({ id: randomUUID(), name: input.name.trim(), timeZone: input.timeZone });
    const user = await User.create({
      id: randomUUID(),
      clinicId: clinic.id,
      email: input.adminEmail.trim(),
      displayName: input.adminName.trim() || searchKey(input.adminEmail),
      roles: ['administrator'],
    });
    const { token, expiresAt } = await issueInvitation(user.id, now);
    return { clinicId: clinic.id, invitationToken: token, expiresAt };
  });
}

function checkZone(timeZone: string, now: Date): void {
  try {
    clinicDate(now, timeZone);
  } catch {
    throw new AppError('invalid-input', `"${timeZone}" is not a time zone. Use one such as America/Denver.`);
  }
}

export async function refuseKnownEmail(email: string): Promise<void> {
  const known = await User.findOne({ where: where(fn('lower', col('email')), email.trim().toLowerCase()) });
  if (known)
    throw new AppError('already-exists', 'There is an account with this e-mail address already. Nothing was stored.', [
      { path: 'email', message: 'There is an account with this e-mail address already' },
    ]);
}
