import type { Revision } from '@slighthill/shared/contracts/common';
import { formatInstant } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { ChangeList } from './change-list';
import { changedFacts, type Fact } from './fact';

interface HistoryListProps {
  history: readonly Revision[];
  /** What an earlier content says, in the same words as the present one. */
  factsOf: (content: Record<string, unknown>) => Fact[];
  now: readonly Fact[];
}

/** Every amendment, newest first, with who, when, why and the earlier values. */
export const HistoryList = ({ history, factsOf, now }: HistoryListProps) => {
  const timeZone = useClinicZone();
  const newestFirst = [...history].sort((a, b) => b.version - a.version);
  if (newestFirst.length === 0) return <p className="text-ink-soft">Not amended since it was entered.</p>;
  return (
    <ol className="flex flex-col">
      {newestFirst.map((revision, index) => {
        const later = newestFirst[index - 1];
        const after = later ? factsOf(later.before) : now;
        return (
          <li key={revision.version} className="border-b border-row py-3">
            <p>
              <span className="font-semibold">{`Amended ${formatInstant(revision.changedAt, timeZone)}`}</span>
              <span className="text-ink-soft">{` by ${revision.changedBy.displayName}`}</span>
            </p>
            <p>{revision.reason}</p>
            <ChangeList changes={changedFacts(factsOf(revision.before), after)} />
          </li>
        );
      })}
    </ol>
  );
};
