import { Dialog as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';
import { cx } from './cx';
import { useOverlayRoot } from './overlay-root';

interface DialogProps {
  title: string;
  /** Said after the title when the dialog opens. */
  description?: ReactNode;
  open: boolean;
  onClose: () => void;
  /** The buttons, the safe one first. */
  actions?: ReactNode;
  width?: 'narrow' | 'wide';
  children?: ReactNode;
}

/** A short question in the middle of the page. It traps focus and gives it back. */
export const Dialog = ({ title, description, open, onClose, actions, width = 'narrow', children }: DialogProps) => {
  const container = useOverlayRoot();
  return (
    <Primitive.Root open={open} onOpenChange={(next) => !next && onClose()}>
      <Primitive.Portal container={container}>
        <Primitive.Overlay className="fixed inset-0 z-50 animate-[appear_160ms_ease-out] bg-ink/20" data-print="hide" />
        <Primitive.Content
          {...(description ? {} : { 'aria-describedby': undefined })}
          className={cx(
            'fixed top-1/2 left-1/2 z-50 max-h-[calc(100dvh-32px)] w-[calc(100vw-32px)] -translate-x-1/2 -translate-y-1/2 animate-[appear_160ms_ease-out] overflow-y-auto rounded-sheet border border-line bg-surface p-6 shadow-reader',
            width === 'narrow' ? 'max-w-110' : 'max-w-160',
          )}
        >
          <Primitive.Title className="text-section">{title}</Primitive.Title>
          {description && <Primitive.Description className="mt-2 text-ink-soft">{description}</Primitive.Description>}
          {children}
          {actions && <div className="mt-6 flex flex-wrap justify-end gap-3">{actions}</div>}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
};
