import type { RefObject } from 'react';
import { useNavigate } from 'react-router-dom';
import { formatDate } from '../../lib/clinic-time';
import { Question } from '../../ui/question';
import type { KnownPatient } from './queries';

interface DuplicateQuestionProps {
  known: KnownPatient;
  others: number;
  place: RefObject<HTMLDivElement | null>;
  onSomeoneElse: () => void;
}

/** Stands between the person and saving until it is answered; saving brings the focus here. */
export const DuplicateQuestion = ({ known, others, place, onSomeoneElse }: DuplicateQuestionProps) => {
  const navigate = useNavigate();
  const more = others > 0 ? ` and ${others} more` : '';
  return (
    <div
      ref={place}
      tabIndex={-1}
      role="group"
      aria-label="A patient with this name and birth date"
      className="rounded-control focus:outline-3 focus:outline-offset-2 focus:outline-gorse row:col-span-2"
    >
      <Question
        note="Answer before saving, so that one person does not get two records."
        answers={[
          { label: 'Open that record', onAnswer: () => void navigate(`/patients/${known.id}`) },
          { label: 'Someone else', onAnswer: onSomeoneElse },
        ]}
      >
        {`Is this ${known.givenName} ${known.familyName}, born ${formatDate(known.birthDate)}, record ${known.recordNumber}${more}?`}
      </Question>
    </div>
  );
};
