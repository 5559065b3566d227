import { Question } from '../../../ui/question';
import type { FormQuestion } from './form-question';

interface QuestionListProps {
  questions: readonly FormQuestion[];
  /** Said under a question: what results use until it is answered. */
  noteOf?: (question: FormQuestion) => string | undefined;
  onFix: (question: FormQuestion, value: string) => void;
  onStand: (question: FormQuestion) => void;
  onChangeIt: (question: FormQuestion) => void;
}

/** Open questions where their fields stand; the likely answer first, then Change it. */
export const QuestionList = ({ questions, noteOf, onFix, onStand, onChangeIt }: QuestionListProps) => (
  <>
    {questions.map((question) => {
      const { fix } = question;
      return (
        <Question
          key={question.key}
          note={noteOf?.(question) ?? question.note}
          answers={[
            ...(fix ? [{ label: fix.label, onAnswer: () => onFix(question, fix.value) }] : []),
            ...(question.mayStand ? [{ label: 'Yes, it is right', onAnswer: () => onStand(question) }] : []),
            { label: 'Change it', onAnswer: () => onChangeIt(question) },
          ]}
        >
          {question.text}
        </Question>
      );
    })}
  </>
);
