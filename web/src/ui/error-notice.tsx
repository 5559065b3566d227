import type { ReactNode } from 'react';
import { Button } from './button';
import { cx } from './cx';
import { Icon } from './icon';

interface ErrorNoticeProps {
  children: ReactNode;
  onRetry?: () => void;
  retrying?: boolean;
  size?: 'staff' | 'patient';
  className?: string;
}

/** What happened, that nothing was lost, and the next step; stands where the content would. */
export const ErrorNotice = ({ children, onRetry, retrying = false, size = 'staff', className }: ErrorNoticeProps) => (
  <div
    role="alert"
    className={cx(
      'flex flex-wrap items-center gap-x-4 gap-y-2 rounded-control bg-rowan-wash px-4 py-3 text-rowan-ink',
      size === 'patient' && 'text-p-note',
      className,
    )}
  >
    <Icon name="alert" />
    <p className="min-w-0 flex-1 basis-60">{children}</p>
    {onRetry && (
      <Button
        kind="second"
        size={size === 'patient' ? 'patient' : 'row'}
        saving={retrying}
        savingLabel="Trying"
        onClick={onRetry}
      >
        Try again
      </Button>
    )}
  </div>
);
