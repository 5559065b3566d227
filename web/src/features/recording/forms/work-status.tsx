import { formatTime } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { Icon } from '../../../ui/icon';
import { countWords } from './form-question';
import type { DraftState } from './use-draft-keeper';

interface WorkStatusProps {
  /** "Not saved. Your numbers are here." takes the place of where the draft is. */
  problem: string | null;
  draft: DraftState;
  openQuestions?: number;
}

const DraftWords = ({ draft }: { draft: DraftState }) => {
  const timeZone = useClinicZone();
  if (draft.kind === 'none') return null;
  if (draft.kind === 'failed')
    return (
      <span className="flex items-start gap-2 text-gorse">
        <Icon name="alert" size={18} />
        <span>The draft could not be kept. What you typed is here.</span>
      </span>
    );
  return (
    <span className="flex items-start gap-2">
      <Icon name="check" size={18} className="text-fern" />
      <span>
        <span className="font-semibold">{`Draft kept ${formatTime(draft.at, timeZone)}.`}</span>{' '}
        <span className="text-ink-soft">Not in the record yet.</span>
      </span>
    </span>
  );
};

/** Where the work is and what is open, at the left of a drawer's foot. */
export const WorkStatus = ({ problem, draft, openQuestions = 0 }: WorkStatusProps) => (
  <>
    <div className="mr-auto min-w-0 flex-1 basis-full text-note row:basis-40">
      <p role="alert" className="flex items-start gap-2 font-semibold text-rowan">
        {problem && (
          <>
            <Icon name="alert" size={18} />
            <span>{problem}</span>
          </>
        )}
      </p>
      <p role="status">{problem === null && <DraftWords draft={draft} />}</p>
    </div>
    <p role="status" className="text-note text-gorse">
      {openQuestions > 0 && countWords(openQuestions)}
    </p>
  </>
);
