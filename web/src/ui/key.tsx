import type { ReactNode } from 'react';

interface KeyProps {
  children: ReactNode;
}

/** A key of the keyboard, as it looks on the keyboard. */
export const Key = ({ children }: KeyProps) => (
  <kbd className="inline-flex min-h-5.5 min-w-5.5 items-center justify-center rounded-tag border border-edge border-b-2 bg-surface px-1.5 font-sans text-head text-ink-soft">
    {children}
  </kbd>
);
