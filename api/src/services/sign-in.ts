import { passwordMatches } from '../auth/passwords';
import { writeAuditEvent } from '../audit/audit-trail';
import { AppError } from '../errors/app-error';
import { User } from '../models/user';
import { fn, col, where } from 'sequelize';

/**
 * Checks e-mail and password. An unknown account, one without a password yet and a wrong password take the same time
 * and get the same answer.
 */
export async function signIn(email: string, password: string, now: Date, address: string | null): Promise<User> {
  const user = await User.findOne({ where: where(fn('lower', col('email')), email.trim().toLowerCase()) });
  const matches = await passwordMatches(user?.passwordHash ?? null, password);
  const admitted = matches && user !== null && user.disabledAt === null;
  if (user)
    await writeAuditEvent(
      {
        clinicId: user.clinicId,
        actorId: user.id,
        actorName: user.displayName,
        action: 'account.sign-in',
        outcome: admitted ? 'done' : 'refused',
        entity: { kind: 'user', id: user.id },
        address,
      },
      now,
    );
  if (!admitted) throw new AppError('wrong-credentials', 'E-mail or password is not right. Check both and try again.');
  return user;
}
