import type { ReactNode } from 'react';

interface PageHeaderProps {
  title: string;
  /** Softer words on the same line, such as a count. */
  note?: ReactNode;
  actions?: ReactNode;
}

export const PageHeader = ({ title, note, actions }: PageHeaderProps) => (
  <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-3">
    <div className="flex flex-wrap items-baseline gap-x-4">
      <h1 className="text-title">{title}</h1>
      {note && <p className="text-ink-soft">{note}</p>}
    </div>
    {actions && <div className="flex flex-wrap gap-2">{actions}</div>}
  </div>
);
