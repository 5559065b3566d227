import { randomUUID } from 'node:crypto';
import { requireTransaction } from '../db/in-transaction';
import { newToken, hashToken } from '../auth/tokens';
import { AccountLink } from '../models/account-link';

const validDays = 7;

export interface IssuedLink {
  token: string;
  /** The token stands behind a #, so that no server ever logs it. */
  path: string;
  expiresAt: Date;
}

/** Makes a single-use link to choose a password; earlier unused links of the account stop working. */
export async function issueInvitation(userId: string, now: Date): Promise<IssuedLink> {
  requireTransaction();
  await AccountLink.update({ usedAt: now }, { where: { userId, usedAt: null } });
  const token = newToken();
  const expiresAt = new Date(now.getTime() + validDays * 86_400_000);
  await AccountLink.create({ id: randomUUID(), tokenHash: hashToken(token), userId, expiresAt, createdAt: now });
  return { token, path: `/welcome#${token}`, expiresAt };
}
