import { Dialog as Primitive } from 'radix-ui';
import { useRef, useState, type ReactNode } from 'react';
import { IconButton } from './icon-button';
import { Key } from './key';
import { useOverlayRoot } from './overlay-root';
import { UnsavedWorkDialog } from './unsaved-work-dialog';
import type { UnsavedWork } from './use-unsaved-work';

interface DrawerProps {
  title: string;
  /** For whom or what, under the title. */
  subtitle?: ReactNode;
  onClose: () => void;
  /** From `useUnsavedWork`: with unsaved work, closing asks once. */
  work?: UnsavedWork;
  /** Where the work is, what is open, and the buttons; stays at the bottom. */
  foot?: ReactNode;
  children: ReactNode;
}

const field = 'input:not([type="hidden"], :disabled), select:not(:disabled), textarea:not(:disabled)';

/**
 * 792 from the right, under the top bar, with the list behind it dimmed and readable; the whole page below 1100.
 * Rendered while it is open: mount it to open it. It traps focus, starts at the first
 * field and gives the focus back.
 */
export const Drawer = ({ title, subtitle, onClose, work, foot, children }: DrawerProps) => {
  const container = useOverlayRoot();
  const body = useRef<HTMLDivElement>(null);
  // Taken before a field of the form takes the focus, so that closing gives it back to what opened the drawer.
  const [opener] = useState(() => (document.activeElement instanceof HTMLElement ? document.activeElement : null));
  const close = (): void => {
    if (work) work.requestLeave(onClose);
    else onClose();
  };
  return (
    <>
      <Primitive.Root open onOpenChange={(next) => !next && close()}>
        <Primitive.Portal container={container}>
          <Primitive.Overlay className="fixed inset-0 top-(--top-bar-height) z-40 bg-ink/4.5" data-print="hide" />
          <Primitive.Content
            aria-describedby={undefined}
            onOpenAutoFocus={(event) => {
              const place = body.current;
              const first = place?.querySelector<HTMLElement>(field);
              if (!place || !first) return;
              event.preventDefault();
              if (!place.contains(document.activeElement)) first.focus();
            }}
            onCloseAutoFocus={(event) => {
              if (!opener?.isConnected || opener === document.body) return;
              event.preventDefault();
              opener.focus();
            }}
            onInteractOutside={(event) => {
              if (event.target instanceof Element && event.target.closest('[data-session-notice]'))
                event.preventDefault();
            }}
            className="fixed top-0 right-0 bottom-0 z-40 flex w-full animate-[drawer-in_180ms_ease-out] flex-col border-rule bg-surface outline-none drawer:top-(--top-bar-height) drawer:w-198 drawer:border-l drawer:shadow-drawer"
          >
            <header className="flex items-start justify-between gap-4 border-b border-line px-5 py-4 row:px-8">
              <div className="min-w-0">
                <Primitive.Title className="text-section">{title}</Primitive.Title>
                {subtitle && <p className="text-note text-ink-soft">{subtitle}</p>}
              </div>
              <div className="flex items-center gap-3">
                <span className="hidden drawer:block">
                  <Key>Esc</Key>
                </span>
                <IconButton icon="close" label="Close" onClick={close} />
              </div>
            </header>
            <div ref={body} className="min-h-0 flex-1 overflow-y-auto px-5 py-5 row:px-8">
              {children}
            </div>
            {foot && (
              <footer className="flex flex-wrap items-center justify-end gap-3 border-t border-line px-5 py-4 row:px-8">
                {foot}
              </footer>
            )}
          </Primitive.Content>
        </Primitive.Portal>
      </Primitive.Root>
      {work && <UnsavedWorkDialog work={work} />}
    </>
  );
};
