import { setTimeout as delay } from 'node:timers/promises';

/** Asks again until the answer is yes; false when the time is over. */
export async function waitUntil(
  ask: () => boolean | Promise<boolean>,
  { timeoutMs, everyMs = 50 }: { timeoutMs: number; everyMs?: number },
): Promise<boolean> {
  const endsAt = Date.now() + timeoutMs;
  for (;;) {
    if (await ask()) return true;
    if (Date.now() >= endsAt) return false;
    await delay(everyMs);
  }
}
