const storageKey = 'slighthill.last-active';

export type IdleState = 'active' | 'warning' | 'expired';

const readShared = (): number => {
  try {
    const value = Number(window.localStorage.getItem(storageKey));
    return Number.isFinite(value) ? value : 0;
  } catch {
    return 0;
  }
};

/** The time of the last touch, shared by all tabs. It holds a time and nothing about a person. */
export const markActive = (atMs: number): void => {
  try {
    window.localStorage.setItem(storageKey, String(atMs));
  } catch {
    // Without storage each tab keeps its own clock.
  }
};

/** Last activity in any tab. A stored time from the future (a clock set back) does not count. */
export const lastActiveMs = (ownMs: number, nowMs: number): number => {
  const shared = readShared();
  return shared > nowMs ? ownMs : Math.max(ownMs, shared);
};

/** Where the idle clock stands: a warning one minute before the limit, expired at it. */
export const idleState = (idleMs: number, limitSeconds: number): IdleState => {
  const limitMs = limitSeconds * 1000;
  if (idleMs >= limitMs) return 'expired';
  return idleMs >= limitMs - 60_000 ? 'warning' : 'active';
};
