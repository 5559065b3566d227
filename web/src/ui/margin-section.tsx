import type { ReactNode } from 'react';
import { cx } from './cx';

interface MarginSectionProps {
  /** What stands in the 128 px margin: a heading, a group, the sections of a record. */
  margin?: ReactNode;
  className?: string;
  children: ReactNode;
}

/** Margin column 128, gap 24, content; below 1000 the margin stands above its content as one line. */
export const MarginSection = ({ margin, className, children }: MarginSectionProps) => (
  <div className={cx('flex flex-col gap-x-6 gap-y-3 margin:grid margin:grid-cols-[128px_minmax(0,1fr)]', className)}>
    <div className="min-w-0">{margin}</div>
    <div className="min-w-0">{children}</div>
  </div>
);
