import { useId, type ReactNode } from 'react';
import { cx } from './cx';
import { VisuallyHidden } from './visually-hidden';

interface SegmentedProps<Value extends string> {
  /** Spoken name of the group. */
  label: string;
  choices: readonly { value: Value; label: ReactNode }[];
  value: Value;
  onValueChange: (value: Value) => void;
  className?: string;
}

/** One of a few views, side by side: radio buttons underneath, so arrows move between them. */
export const Segmented = <Value extends string>({
  label,
  choices,
  value,
  onValueChange,
  className,
}: SegmentedProps<Value>) => {
  const name = useId();
  return (
    <fieldset className={cx('inline-flex rounded-control border border-rim bg-surface', className)}>
      <VisuallyHidden as="legend">{label}</VisuallyHidden>
      {choices.map((choice) => (
        <label
          key={choice.value}
          className={cx(
            'relative flex min-h-9 cursor-pointer items-center border-l border-rim px-4 text-body font-semibold transition-colors duration-120 first-of-type:rounded-l-control first-of-type:border-l-0 last-of-type:rounded-r-control',
            'has-focus-visible:z-1 has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-tarn',
            value === choice.value ? 'bg-tarn-wash text-tarn-deep' : 'text-ink hover:bg-mist',
          )}
        >
          <input
            type="radio"
            name={name}
            value={choice.value}
            checked={value === choice.value}
            onChange={() => onValueChange(choice.value)}
            className="absolute inset-0 cursor-pointer opacity-0"
          />
          {choice.label}
        </label>
      ))}
    </fieldset>
  );
};
