import { createHash, randomBytes } from 'node:crypto';

/** A token to put in a link or cookie; 160 bits, safe in a URL. */
export const newToken = (): string => randomBytes(20).toString('base64url');

/** Only this is stored, so that a copy of the database opens nothing. */
export const hashToken = (token: string): string => createHash('sha256').update(token).digest('hex');
