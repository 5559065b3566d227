import type { FactChange } from './fact';

interface ChangeListProps {
  changes: readonly FactChange[];
}

/** Earlier value struck through, then the later one; spoken as "was" and "now". */
export const ChangeList = ({ changes }: ChangeListProps) => (
  <ul className="mt-1 flex flex-col gap-0.5 text-note">
    {changes.map(({ label, before, after }) => (
      <li key={label}>
        <span className="text-ink-soft">{`${label}: `}</span>
        {before === null ? (
          <span className="text-ink-soft">not said</span>
        ) : (
          <>
            <span className="sr-only">was </span>
            <del className="text-ink-soft">{before}</del>
          </>
        )}
        <span>{`, now ${after ?? 'not said'}`}</span>
      </li>
    ))}
  </ul>
);
