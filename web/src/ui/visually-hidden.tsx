import type { ReactNode } from 'react';

interface VisuallyHiddenProps {
  as?: 'span' | 'legend' | 'h2' | 'caption' | 'p';
  children: ReactNode;
}

export const VisuallyHidden = ({ as: Tag = 'span', children }: VisuallyHiddenProps) => (
  <Tag className="sr-only">{children}</Tag>
);
