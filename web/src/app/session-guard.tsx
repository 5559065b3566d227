import { useQueryClient } from '@tanstack/react-query';
import type { CurrentUser } from '@slighthill/shared/contracts/auth';
import { useEffect, useRef, useState, type ReactNode } from 'react';
import { setCoverTitle } from '../lib/page-title';
import { meQuery } from '../lib/session';
import { onSessionNews } from '../lib/session-channel';
import { useIdleSession } from '../lib/use-idle-session';
import { OverlayRootContext } from '../ui/overlay-root';
import { IdleWarning } from './idle-warning';
import { SessionCover } from './session-cover';

interface SessionGuardProps {
  user: CurrentUser;
  children: ReactNode;
}

/** Another tab signed in as someone else, or signed out: what this tab shows is no longer its reader's. */
const useOtherTabs = (userId: string): void => {
  const client = useQueryClient();
  useEffect(
    () =>
      onSessionNews((news) => {
        if (news.kind === 'signed-in' && news.userId === userId) return;
        client.clear();
        window.location.assign(news.kind === 'signed-in' ? '/' : '/sign-in');
      }),
    [client, userId],
  );
};

/**
 * Covers the page when its person has been away or the server ended the session. The tree below stays mounted, so
 * that a half-filled form is there again after the password; meanwhile nothing of it can be seen, reached or heard.
 */
export const SessionGuard = ({ user, children }: SessionGuardProps) => {
  const client = useQueryClient();
  const { state, secondsLeft, resume } = useIdleSession(user.idleSeconds);
  const [overlayRoot, setOverlayRoot] = useState<HTMLElement | null>(null);
  const covered = state === 'expired';
  const lastFocused = useRef<HTMLElement | null>(null);
  useOtherTabs(user.id);

  useEffect(() => {
    setCoverTitle(covered ? 'Password needed' : null);
    return () => setCoverTitle(null);
  }, [covered]);

  const welcomeBack = (same: CurrentUser): void => {
    client.setQueryData(meQuery.queryKey, same);
    resume();
    void client.invalidateQueries({ predicate: (query) => query.queryKey[0] !== 'me' });
  };

  return (
    <OverlayRootContext value={overlayRoot}>
      <div
        inert={covered}
        aria-hidden={covered || undefined}
        data-covered={covered || undefined}
        className={covered ? 'invisible' : ''}
        onFocus={({ target }) => {
          lastFocused.current = target;
        }}
      >
        {children}
        <div ref={setOverlayRoot} />
      </div>
      {state === 'warning' && <IdleWarning secondsLeft={secondsLeft} onStay={resume} />}
      {covered && (
        <SessionCover user={user} onWelcomeBack={welcomeBack} onLifted={() => lastFocused.current?.focus()} />
      )}
    </OverlayRootContext>
  );
};
