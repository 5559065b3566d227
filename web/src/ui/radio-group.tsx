import { useId, type ReactNode, type Ref } from 'react';
import { cx } from './cx';

export interface RadioChoice<Value extends string> {
  value: Value;
  label: ReactNode;
  hint?: ReactNode;
}

interface RadioGroupProps<Value extends string> {
  legend: ReactNode;
  choices: readonly RadioChoice<Value>[];
  value: Value | null;
  onValueChange: (value: Value) => void;
  error?: string | undefined;
  hint?: ReactNode;
  /** `row` keeps short choices on one line; `list` gives each its own line and hint. */
  arrange?: 'row' | 'list';
  name?: string;
  disabled?: boolean;
  /** The first choice, so that a form can bring the reader here. */
  inputRef?: Ref<HTMLInputElement>;
}

export const RadioGroup = <Value extends string>({
  legend,
  choices,
  value,
  onValueChange,
  error,
  hint,
  arrange = 'row',
  name,
  disabled = false,
  inputRef,
}: RadioGroupProps<Value>) => {
  const id = useId();
  const note = error ?? hint;
  return (
    <fieldset
      aria-describedby={note ? `${id}-note` : undefined}
      disabled={disabled}
      className="flex min-w-0 flex-col gap-1"
    >
      <legend className="text-note">{legend}</legend>
      <div
        className={cx('flex', arrange === 'row' ? 'min-h-10 flex-wrap items-center gap-x-6 gap-y-1' : 'flex-col gap-1')}
      >
        {choices.map((choice, index) => (
          <label key={choice.value} className="flex min-h-8 cursor-pointer items-start gap-3 py-1 text-body">
            <input
              type="radio"
              ref={index === 0 ? inputRef : undefined}
              name={name ?? id}
              value={choice.value}
              checked={value === choice.value}
              aria-invalid={error ? true : undefined}
              onChange={() => onValueChange(choice.value)}
              className="mt-0.5 size-5 shrink-0 cursor-pointer appearance-none rounded-chip border border-edge bg-surface checked:border-6 checked:border-tarn"
            />
            <span>
              {choice.label}
              {choice.hint && <span className="block text-note text-ink-soft">{choice.hint}</span>}
            </span>
          </label>
        ))}
      </div>
      {note && (
        <p id={`${id}-note`} className={cx('text-note', error ? 'text-rowan' : 'text-ink-soft')}>
          {note}
        </p>
      )}
    </fieldset>
  );
};
