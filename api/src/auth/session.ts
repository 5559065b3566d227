import { Lucia, TimeSpan } from 'lucia';
import { AuthSession } from '../models/auth-session';
import type { Actor } from '../policies/actor';
import { SequelizeAdapter, type SessionAttributes, type UserAttributes } from './sequelize-adapter';
import { hashToken } from './tokens';

/** No session outlives a working day, however active. */
const absoluteLifetimeH = 12;
export const staffIdleS = 15 * 60;
/** Activity is written at most this often. */
const activityGrainS = 30;

export type SessionResult =
  | { state: 'signed-in'; actor: Actor; email: string; cookieToRefresh: string | null; token: string }
  | { state: 'none' | 'idle' };

export interface Sessions {
  create(userId: string, now: Date): Promise<{ cookie: string }>;
  read(cookieHeader: string | undefined, now: Date, countsAsActivity: boolean): Promise<SessionResult>;
  revoke(token: string): Promise<void>;
  revokeAllOf(userId: string): Promise<void>;
  deleteExpired(): Promise<void>;
  blankCookie(): string;
}

/** The only module that knows the session library. */
export function createSessions(options: { secureCookies: boolean }): Sessions {
  const lucia = new Lucia(new SequelizeAdapter(), {
    sessionExpiresIn: new TimeSpan(absoluteLifetimeH, 'h'),
    sessionCookie: {
      name: options.secureCookies ? '__Host-slighthill' : 'slighthill',
      expires: false,
      attributes: { secure: options.secureCookies, sameSite: 'lax', path: '/' },
    },
    getSessionAttributes: (attributes) => attributes,
    getUserAttributes: (attributes) => attributes,
  });

  return {
    async create(userId, now) {
      const session = await lucia.createSession(userId, { lastActiveAt: now, createdAt: now });
      return { cookie: lucia.createSessionCookie(session.id).serialize() };
    },

    async read(cookieHeader, now, countsAsActivity) {
      const token = readCookie(lucia, cookieHeader);
      if (!token) return { state: 'none' };
      const { session, user } = await lucia.validateSession(token);
      if (!session || !user || user.disabledAt !== null) return { state: 'none' };
      const ageMs = now.getTime() - session.createdAt.getTime();
      if (ageMs > absoluteLifetimeH * 3_600_000) {
        await lucia.invalidateSession(token);
        return { state: 'none' };
      }
      const idleMs = now.getTime() - session.lastActiveAt.getTime();
      if (!user.roles.includes('patient') && idleMs >= staffIdleS * 1000) {
        await lucia.invalidateSession(token);
        return { state: 'idle' };
      }
      if (countsAsActivity && idleMs >= activityGrainS * 1000)
        await AuthSession.update({ lastActiveAt: now }, { where: { tokenHash: hashToken(token) } });
      return {
        state: 'signed-in',
        token,
        email: user.email,
        cookieToRefresh: session.fresh ? lucia.createSessionCookie(token).serialize() : null,
        actor: {
          userId: user.id,
          displayName: user.displayName,
          roles: user.roles,
          patientId: user.patientId,
          clinicId: user.clinicId,
          clinic: user.clinic,
        },
      };
    },

    revoke: (token) => lucia.invalidateSession(token),
    revokeAllOf: (userId) => lucia.invalidateUserSessions(userId),
    deleteExpired: () => lucia.deleteExpiredSessions(),
    blankCookie: () => lucia.createBlankSessionCookie().serialize(),
  };
}

/** The library throws on a malformed escape in any cookie; that is simply no session. */
function readCookie(lucia: Lucia, header: string | undefined): string | null {
  try {
    return lucia.readSessionCookie(header ?? '');
  } catch {
    return null;
  }
}

declare module 'lucia' {
  interface Register {
    Lucia: Lucia<SessionAttributes, UserAttributes>;
    DatabaseSessionAttributes: SessionAttributes;
    DatabaseUserAttributes: UserAttributes;
    UserId: string;
  }
}
