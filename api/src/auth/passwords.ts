import { hash, verify } from '@node-rs/argon2';

/** argon2id with the library's defaults (19 MiB, 2 passes), which follow the common minimum for interactive sign-in. */
export async function hashPassword(password: string): Promise<string> {
  return await hash(password);
}

let decoy: Promise<string> | null = null;

/**
 * Checks a password; without a stored hash the same work is done against a decoy, so that an unknown account takes as
 * long as a wrong password.
 */
export async function passwordMatches(stored: string | null, password: string): Promise<boolean> {
  decoy ??= hash('no account has this password');
  try {
    const matches = await verify(stored ?? (await decoy), password);
    return stored !== null && matches;
  } catch {
    return false;
  }
}

/** Makes the decoy ahead of the first sign-in, which would otherwise pay for it. */
export async function warmPasswords(): Promise<void> {
  await passwordMatches(null, 'warm up');
}
