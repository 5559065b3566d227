import type { UserCreate, UserPatch } from '@slighthill/shared/contracts/clinic';
import { AppError } from '../errors/app-error';
import { AuthSession } from '../models/auth-session';
import { User } from '../models/user';
import { runCommand, type CommandContext } from './command-context';
import { refuseKnownEmail } from './create-clinic';
import { createOnce } from './create-once';
import { issueInvitation, type IssuedLink } from './invitations';
import { lockForChange } from './lock-for-change';

/** Adds a member of staff; the link to choose a password is shown once, on the first answer only. */
export async function addUser(
  context: CommandContext,
  body: UserCreate,
): Promise<{ user: User; link: IssuedLink | null; isNew: boolean }> {
  return await runCommand(context, async () => {
    let link: IssuedLink | null = null;
    const created = await createOnce<User>(context, {
      kind: 'user',
      id: body.id,
      request: body,
      find: (id) => User.findByPk(id),
      create: async (id) => {
        await refuseKnownEmail(body.email);
        const user = await User.create({
          id,
          clinicId: context.actor.clinicId,
          email: body.email,
          displayName: body.displayName,
          credential: body.credential,
          roles: body.roles,
        });
        link = await issueInvitation(user.id, context.clock.now());
        return user;
      },
    });
    context.audit.about('user', created.row.id);
    return { user: created.row, link, isNew: created.isNew };
  });
}

/** Changes name, roles or access. New roles or a disabled account end its sessions at once. */
export async function updateUser(context: CommandContext, id: string, body: UserPatch): Promise<User> {
  return await runCommand(context, async () => {
    const user = await lockStaff(context, id, body.version);
    if (
      id === context.actor.userId &&
      (body.disabled === true || (body.roles && !body.roles.includes('administrator')))
    )
      throw new AppError('wrong-state', 'You cannot take your own administration away. Ask another administrator.');
    const disabledAt = body.disabled === undefined ? user.disabledAt : body.disabled ? context.clock.now() : null;
    const rolesChange = body.roles !== undefined && [...body.roles].sort().join() !== [...user.roles].sort().join();
    const changes = {
      ...(body.displayName === undefined ? {} : { displayName: body.displayName }),
      ...(body.credential === undefined ? {} : { credential: body.credential }),
      ...(rolesChange ? { roles: body.roles! } : {}),
      ...((disabledAt === null) === (user.disabledAt === null) ? {} : { disabledAt }),
    };
    if (Object.keys(changes).length === 0) return user;
    await user.update({ ...changes, version: user.version + 1 });
    if (rolesChange || body.disabled) await AuthSession.destroy({ where: { userId: user.id } });
    return user;
  });
}

/** A fresh link for someone who lost the first one or the password. */
export async function inviteAgain(context: CommandContext, id: string): Promise<IssuedLink> {
  return await runCommand(context, async () => {
    const user = await User.findOne({ where: { id, clinicId: context.actor.clinicId }, lock: true });
    if (!user || user.disabledAt !== null) throw new AppError('wrong-state', 'This account is switched off.');
    context.audit.about('user', user.id);
    return await issueInvitation(user.id, context.clock.now());
  });
}

async function lockStaff(context: CommandContext, id: string, version: number): Promise<User> {
  const user = await lockForChange(context, User, id, version);
  context.audit.about('user', user.id);
  if (user.roles.includes('patient'))
    throw new AppError('wrong-state', 'A patient\u2019s account holds no staff role.');
  return user;
}
