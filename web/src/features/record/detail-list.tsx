import type { ReactNode } from 'react';

interface DetailListProps {
  title: string;
  rows: readonly (readonly [label: string, value: string])[];
  /** Said when there are no rows. */
  empty?: string;
  action?: ReactNode;
}

export const DetailList = ({ title, rows, empty, action }: DetailListProps) => (
  <section aria-label={title} className="mb-8">
    <div className="flex min-h-9 flex-wrap items-center justify-between gap-3 border-b border-rule pb-2">
      <h2 tabIndex={-1} className="text-section">
        {title}
      </h2>
      <div data-print="hide">{action}</div>
    </div>
    {rows.length === 0 ? (
      <p className="py-3 text-ink-soft">{empty}</p>
    ) : (
      <dl>
        {rows.map(([label, value]) => (
          <div key={label} className="gap-x-6 border-b border-row py-2.5 row:grid row:grid-cols-[264px_minmax(0,1fr)]">
            <dt className="text-ink-soft">{label}</dt>
            <dd className="min-w-0 break-words">{value}</dd>
          </div>
        ))}
      </dl>
    )}
  </section>
);
