import type { ReactNode } from 'react';
import { FlatHill } from './flat-hill';

interface EmptyStateProps {
  /** One sentence. */
  children: ReactNode;
  /** One button. */
  action?: ReactNode;
}

export const EmptyState = ({ children, action }: EmptyStateProps) => (
  <div className="flex flex-col items-start gap-4 py-8">
    <FlatHill />
    <p>{children}</p>
    {action}
  </div>
);
