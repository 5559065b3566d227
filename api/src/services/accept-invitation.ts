import { hashPassword } from '../auth/passwords';
import { hashToken } from '../auth/tokens';
import { writeAuditEvent } from '../audit/audit-trail';
import { inTransaction } from '../db/in-transaction';
import { AppError } from '../errors/app-error';
import { AccountLink } from '../models/account-link';
import { AuthSession } from '../models/auth-session';
import { User } from '../models/user';

const gone = () =>
  new AppError('not-found', 'This link was used already or has run out. Ask your administrator for a new one.');

/** The person an unused, current link belongs to. */
export async function findInvited(token: string, now: Date): Promise<User> {
  const link = await AccountLink.findOne({ where: { tokenHash: hashToken(token), usedAt: null } });
  if (!link || link.expiresAt.getTime() <= now.getTime()) throw gone();
  const user = await User.findByPk(link.userId);
  if (!user || user.disabledAt !== null) throw gone();
  return user;
}

/** Sets the password and uses up the link; every session the account had ends. */
export async function acceptInvitation(
  token: string,
  password: string,
  now: Date,
  address: string | null,
): Promise<User> {
  const user = await findInvited(token, now);
  const passwordHash = await hashPassword(password);
  return await inTransaction(async () => {
    const [used] = await AccountLink.update({ usedAt: now }, { where: { tokenHash: hashToken(token), usedAt: null } });
    if (used === 0) throw gone();
    await AuthSession.destroy({ where: { userId: user.id } });
    await user.update({ passwordHash, version: user.version + 1 });
    await writeAuditEvent(
      {
        clinicId: user.clinicId,
        actorId: user.id,
        actorName: user.displayName,
        action: 'account.password-chosen',
        entity: { kind: 'user', id: user.id },
        address,
      },
      now,
    );
    return user;
  });
}
