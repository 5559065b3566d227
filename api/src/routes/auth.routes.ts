import {
  invitationAcceptBody,
  invitationLookUpBody,
  invitationResponse,
  signInBody,
  userResponse,
} from '@slighthill/shared/contracts/auth';
import type { Sessions } from '../auth/session';
import { AppError } from '../errors/app-error';
import { defineRoute, Reply, type Route } from '../http/define-route';
import { Clinic } from '../models/clinic';
import type { User } from '../models/user';
import type { Actor } from '../policies/actor';
import { presentCurrentUser } from '../presenters/current-user';
import { acceptInvitation, findInvited } from '../services/accept-invitation';
import type { Clock } from '../services/command-context';
import { signIn } from '../services/sign-in';
import { writeAuditEvent } from '../audit/audit-trail';

export function authRoutes({ sessions, clock }: { sessions: Sessions; clock: Clock }): Route[] {
  const open = async (user: User) => {
    const clinic = await Clinic.findByPk(user.clinicId);
    if (!clinic) throw new AppError('internal', 'The clinic of this account is missing.');
    const { cookie } = await sessions.create(user.id, clock.now());
    return new Reply(200, { user: presentCurrentUser(actorOf(user, clinic), user.email) }, { 'Set-Cookie': cookie });
  };

  return [
    defineRoute({
      method: 'post',
      path: '/api/auth/sign-in',
      contract: { summary: 'Sign in with e-mail and password', body: signInBody, response: userResponse },
      access: 'public',
      audit: 'account.sign-in',
      limits: ['sign-in-address', 'sign-in-account'],
      handler: async ({ body, request }) =>
        open(await signIn(body.email, body.password, clock.now(), request.ip ?? null)),
    }),
    defineRoute({
      method: 'post',
      path: '/api/auth/sign-out',
      contract: { summary: 'End this session', response: null },
      access: 'public',
      audit: 'account.sign-out',
      handler: async ({ request }) => {
        const now = clock.now();
        const session = await sessions.read(request.headers.cookie, now, false);
        if (session.state === 'signed-in') {
          await sessions.revoke(session.token);
          await writeAuditEvent(
            {
              clinicId: session.actor.clinicId,
              actorId: session.actor.userId,
              actorName: session.actor.displayName,
              action: 'account.sign-out',
              entity: { kind: 'user', id: session.actor.userId },
              address: request.ip ?? null,
            },
            now,
          );
        }
        return new Reply(204, undefined, { 'Set-Cookie': sessions.blankCookie() });
      },
    }),
    defineRoute({
      method: 'get',
      path: '/api/auth/me',
      contract: { summary: 'Who is signed in, and what they may do', response: userResponse },
      access: 'signed-in',
      audit: 'account.read',
      handler: async ({ context, request }) => ({
        user: presentCurrentUser(context.actor, String(request.res?.locals.email)),
      }),
    }),
    defineRoute({
      method: 'post',
      path: '/api/auth/activity',
      contract: { summary: 'Keep the session from going idle', response: null },
      access: 'signed-in',
      audit: 'account.activity',
      handler: async () => undefined,
    }),
    defineRoute({
      method: 'post',
      path: '/api/auth/invitation/look-up',
      contract: { summary: 'Whose a link is', body: invitationLookUpBody, response: invitationResponse },
      access: 'public',
      audit: 'account.link-read',
      limits: ['link-address'],
      handler: async ({ body }) => {
        const user = await findInvited(body.token, clock.now());
        const clinic = await Clinic.findByPk(user.clinicId);
        return { displayName: user.displayName, email: user.email, clinicName: clinic?.name ?? '' };
      },
    }),
    defineRoute({
      method: 'post',
      path: '/api/auth/invitation/accept',
      contract: { summary: 'Choose a password and sign in', body: invitationAcceptBody, response: userResponse },
      access: 'public',
      audit: 'account.password-chosen',
      limits: ['link-address'],
      handler: async ({ body, request }) =>
        open(await acceptInvitation(body.token, body.password, clock.now(), request.ip ?? null)),
    }),
  ];
}

function actorOf(user: User, clinic: Clinic): Actor {
  return {
    userId: user.id,
    displayName: user.displayName,
    roles: user.roles,
    patientId: user.patientId,
    clinicId: user.clinicId,
    clinic,
  };
}
