import { useCallback, useEffect, useRef, useState } from 'react';
import { useBlocker } from 'react-router-dom';

export interface UnsavedWork {
  dirty: boolean;
  /** True while the reader is asked whether to leave. */
  asking: boolean;
  /** Leave now if nothing is unsaved, else ask first. */
  requestLeave: (leave: () => void) => void;
  stay: () => void;
  leave: () => void;
  /** The work is in the record: the next move leaves without a question. */
  release: () => void;
}

/** Asks once before unsaved work is left, whether by a link, the back button, a close button or the tab itself. */
export const useUnsavedWork = (dirty: boolean): UnsavedWork => {
  const released = useRef(false);
  const pending = useRef<(() => void) | null>(null);
  const [askingClose, setAskingClose] = useState(false);
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      dirty && !released.current && currentLocation.pathname !== nextLocation.pathname,
  );

  useEffect(() => {
    if (!dirty) return undefined;
    const warn = (event: BeforeUnloadEvent): void => {
      if (!released.current) event.preventDefault();
    };
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [dirty]);

  const release = useCallback(() => {
    released.current = true;
  }, []);

  const requestLeave = useCallback(
    (leave: () => void) => {
      if (!dirty || released.current) {
        leave();
        return;
      }
      pending.current = leave;
      setAskingClose(true);
    },
    [dirty],
  );

  const stay = (): void => {
    pending.current = null;
    setAskingClose(false);
    if (blocker.state === 'blocked') blocker.reset();
  };

  const leave = (): void => {
    released.current = true;
    setAskingClose(false);
    if (blocker.state === 'blocked') blocker.proceed();
    else pending.current?.();
    pending.current = null;
  };

  return { dirty, asking: askingClose || blocker.state === 'blocked', requestLeave, stay, leave, release };
};
