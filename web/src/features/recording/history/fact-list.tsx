import type { Fact } from './fact';

interface FactListProps {
  facts: readonly Fact[];
}

export const FactList = ({ facts }: FactListProps) => (
  <dl className="grid gap-x-8 gap-y-2 row:grid-cols-[max-content_1fr]">
    {facts.map(({ label, value }) => (
      <div key={label} className="contents max-row:block">
        <dt className="text-note text-ink-soft row:pt-px">{label}</dt>
        <dd className="max-row:mb-2">{value}</dd>
      </div>
    ))}
  </dl>
);
