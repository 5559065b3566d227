import type { ReactNode } from 'react';
import { cx } from './cx';
import { Icon } from './icon';

interface SavedNoteProps {
  /** Where it went; null keeps an empty place, so that a screen reader announces what appears. */
  children: ReactNode;
}

/** Said in place, where the work is, instead of a message that floats over the page. */
export const SavedNote = ({ children }: SavedNoteProps) => (
  <p role="status" className={cx('flex items-center gap-2 text-note text-fern', Boolean(children) && 'min-h-6')}>
    {children && (
      <>
        <Icon name="check" size={18} />
        <span>{children}</span>
      </>
    )}
  </p>
);
