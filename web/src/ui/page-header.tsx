import type { ReactNode } from 'react';

interface PageHeaderProps {
  title: string;
  /** Softer words on the same line, such as a count. */
  note?: ReactNode;
  actions?: ReactNode;
  /** 2 where the page's own name stands above it, as in a patient's record. */
  level?: 1 | 2;
}

export const PageHeader = ({ title, note, actions, level = 1 }: PageHeaderProps) => {
  const Heading = `h${level}` as const;
  return (
    <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-3">
      <div className="flex flex-wrap items-baseline gap-x-4">
        <Heading className="text-title">{title}</Heading>
        {note && <p className="text-ink-soft">{note}</p>}
      </div>
      {actions && <div className="flex flex-wrap gap-2">{actions}</div>}
    </div>
  );
};
