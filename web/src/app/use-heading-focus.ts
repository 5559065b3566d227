import { useEffect, useRef } from 'react';
import { useMatches } from 'react-router-dom';

/** A page whose heading is not there by then keeps the focus where its reader put it. */
const waitMs = 10_000;

/** A route with this handle lies over its page as a drawer: it has a focus of its own and gives it back. */
export const overPage = { overPage: true } as const;

const isOverPage = (handle: unknown): boolean =>
  typeof handle === 'object' && handle !== null && 'overPage' in handle && handle.overPage === true;

/** Someone is at work meanwhile: in a field, a dialog, or anywhere they went since the page changed. */
const isTaken = (before: Element | null): boolean => {
  const now = document.activeElement;
  if (now === null || now === document.body) return false;
  return now !== before || now.closest('[role="dialog"], input, textarea, select') !== null;
};

const focusHeading = (): boolean => {
  const heading = document.querySelector<HTMLElement>('main h1');
  if (!heading || heading.closest('[inert]')) return false;
  if (!heading.hasAttribute('tabindex')) heading.tabIndex = -1;
  heading.focus({ preventScroll: true });
  return true;
};

/**
 * Moves the focus to the new page's h1, so that it is read out and the next Tab starts there. The first page of a
 * visit keeps the browser's own start.
 */
export const useHeadingFocus = (): void => {
  const page = useMatches().findLast(({ handle }) => !isOverPage(handle))?.pathname ?? '';
  const seen = useRef(page);
  useEffect(() => {
    if (seen.current === page) return undefined;
    seen.current = page;
    const before = document.activeElement;
    const done = (): boolean => isTaken(before) || focusHeading();
    if (done()) return undefined;
    const watch = new MutationObserver(() => done() && watch.disconnect());
    watch.observe(document.body, { childList: true, subtree: true });
    const timer = window.setTimeout(() => watch.disconnect(), waitMs);
    return () => {
      window.clearTimeout(timer);
      watch.disconnect();
    };
  }, [page]);
};
