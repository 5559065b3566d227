import { useNavigate } from 'react-router-dom';
import { formatDate } from '../../lib/clinic-time';
import { Question } from '../../ui/question';
import type { KnownPatient } from './queries';

interface DuplicateQuestionProps {
  known: KnownPatient;
  others: number;
  onSomeoneElse: () => void;
}

export const DuplicateQuestion = ({ known, others, onSomeoneElse }: DuplicateQuestionProps) => {
  const navigate = useNavigate();
  const more = others > 0 ? ` and ${others} more` : '';
  return (
    <Question
      note="Saving still works; then there are two records."
      answers={[
        { label: 'Open that record', onAnswer: () => void navigate(`/patients/${known.id}`) },
        { label: 'Someone else', onAnswer: onSomeoneElse },
      ]}
    >
      {`Is this ${known.givenName} ${known.familyName}, born ${formatDate(known.birthDate)}, record ${known.recordNumber}${more}?`}
    </Question>
  );
};
