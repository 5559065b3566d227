import { useCallback, useEffect, useEffectEvent, useRef, useState } from 'react';
import { apiFetch } from './api-fetch';
import { idleState, lastActiveMs, markActive, type IdleState } from './idle-clock';
import { onSessionEnded } from './session-events';

const activityEvents = ['pointerdown', 'pointermove', 'keydown', 'wheel', 'touchstart'] as const;
const keepAliveMs = 30_000;

interface IdleSession {
  state: IdleState;
  secondsLeft: number;
  /** The person is here: by the button of the warning, or with the password after the cover. */
  resume: () => void;
}

/**
 * Counts from the last touch in any tab. Background requests are no activity: the server hears of a touch only
 * through the keep-alive, at most every 30 s. Once expired, only `resume` opens the page again.
 */
export const useIdleSession = (limitSeconds: number | null): IdleSession => {
  const [state, setState] = useState<IdleState>('active');
  const [secondsLeft, setSecondsLeft] = useState(60);
  const lastMs = useRef(0);
  const expired = useRef(false);
  const keptAliveMs = useRef(0);

  const expire = useCallback(() => {
    expired.current = true;
    setState('expired');
  }, []);

  const check = useEffectEvent((): IdleState => {
    if (expired.current) return 'expired';
    if (limitSeconds === null) return 'active';
    const now = Date.now();
    const idleMs = now - lastActiveMs(lastMs.current, now);
    const next = idleState(idleMs, limitSeconds);
    if (next === 'expired') expire();
    else setState(next);
    setSecondsLeft(Math.max(0, Math.ceil(limitSeconds - idleMs / 1000)));
    return next;
  });

  const keepAlive = useEffectEvent((now: number) => {
    if (now - keptAliveMs.current < keepAliveMs) return;
    keptAliveMs.current = now;
    // An answer of 401 covers the page through the API client; a lost connection is told by the next real request.
    apiFetch('/api/auth/activity', { method: 'POST' }).catch(() => undefined);
  });

  const touch = useEffectEvent(() => {
    // A computer that slept wakes with a touch: the time asleep counts first.
    if (check() === 'expired') return;
    const now = Date.now();
    lastMs.current = now;
    if (limitSeconds === null) return;
    markActive(now);
    setState('active');
    keepAlive(now);
  });

  useEffect(() => {
    lastMs.current = Date.now();
    keptAliveMs.current = lastMs.current;
    markActive(lastMs.current);
    const timer = window.setInterval(check, 1000);
    document.addEventListener('visibilitychange', check);
    for (const name of activityEvents) document.addEventListener(name, touch, { capture: true, passive: true });
    const stopListening = onSessionEnded(expire);
    return () => {
      window.clearInterval(timer);
      document.removeEventListener('visibilitychange', check);
      for (const name of activityEvents) document.removeEventListener(name, touch, { capture: true });
      stopListening();
    };
  }, [expire]);

  const resume = useCallback(() => {
    expired.current = false;
    lastMs.current = Date.now();
    markActive(lastMs.current);
    setState('active');
  }, []);

  return { state, secondsLeft, resume };
};
