import type { ReactNode } from 'react';
import { Button } from './button';
import { cx } from './cx';

interface QuestionProps {
  /** "65 cm. Did you mean 65 inches (165.1 cm)?" */
  children: ReactNode;
  /** What happens until it is answered. */
  note?: ReactNode;
  /** The likely answer and the others, in order; the first is drawn as the offered one. */
  answers?: readonly { label: string; onAnswer: () => void }[];
  className?: string;
}

/** Asked in gorse where the value stands; it never stops anyone from typing on. */
export const Question = ({ children, note, answers = [], className }: QuestionProps) => (
  <div
    role="status"
    className={cx('flex flex-wrap items-center gap-x-4 gap-y-2 rounded-control bg-gorse-wash px-4 py-3', className)}
  >
    <div className="min-w-0 flex-1 basis-70">
      <div className="font-semibold text-gorse-ink">{children}</div>
      {note && <div className="text-note text-gorse-note">{note}</div>}
    </div>
    {answers.map((answer, index) => (
      <Button
        key={answer.label}
        kind={index === 0 ? 'second' : 'quiet'}
        size="row"
        onClick={answer.onAnswer}
        className={index === 0 ? 'border-gorse text-gorse-ink' : 'text-gorse-ink hover:bg-surface'}
      >
        {answer.label}
      </Button>
    ))}
  </div>
);
