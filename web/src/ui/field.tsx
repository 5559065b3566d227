import { useId, useMemo, type ReactNode } from 'react';
import { cx } from './cx';
import { FieldContext } from './field-context';

interface FieldProps {
  label: ReactNode;
  /** Extra words after the label in a lighter weight, such as "optional". */
  labelNote?: string;
  hint?: ReactNode;
  error?: string | undefined;
  /** A question marks the field in gorse; its text and answers stand in a `Question` beside it. */
  question?: string | undefined;
  required?: boolean;
  size?: 'staff' | 'patient';
  className?: string;
  children: ReactNode;
}

/** Label above, one control, hint below; an error or a question in words replaces the hint. */
export const Field = ({
  label,
  labelNote,
  hint,
  error,
  question,
  required = false,
  size = 'staff',
  className,
  children,
}: FieldProps) => {
  const id = useId();
  const message = error ?? question ?? hint;
  const noteId = `${id}-note`;
  const context = useMemo(
    () => ({
      controlId: `${id}-control`,
      describedBy: message === undefined || message === null ? undefined : noteId,
      state: error ? ('error' as const) : question ? ('question' as const) : ('plain' as const),
      required,
    }),
    [id, noteId, message, error, question, required],
  );
  const note = size === 'patient' ? 'text-p-note' : 'text-note';
  return (
    <FieldContext value={context}>
      <div className={cx('flex min-w-0 flex-col gap-1', className)}>
        <label htmlFor={context.controlId} className={size === 'patient' ? 'text-p-label' : 'text-note text-ink'}>
          {label}
          {labelNote && <span className="text-ink-soft"> {labelNote}</span>}
        </label>
        {children}
        {message !== undefined && message !== null && (
          <p id={noteId} className={cx(note, error ? 'text-rowan' : question ? 'text-gorse' : 'text-ink-soft')}>
            {message}
          </p>
        )}
      </div>
    </FieldContext>
  );
};
