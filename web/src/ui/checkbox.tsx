import { useId, type InputHTMLAttributes, type ReactNode, type Ref } from 'react';
import { cx } from './cx';

interface CheckboxProps extends Omit<InputHTMLAttributes<HTMLInputElement>, 'type'> {
  label: ReactNode;
  hint?: ReactNode;
  ref?: Ref<HTMLInputElement> | undefined;
}

export const Checkbox = ({ label, hint, className, ...rest }: CheckboxProps) => {
  const hintId = useId();
  return (
    <span className={cx('flex flex-col', className)}>
      <label className="flex min-h-8 cursor-pointer items-center gap-3 text-body">
        <span className="relative flex size-5 shrink-0">
          <input
            {...rest}
            type="checkbox"
            aria-describedby={hint ? hintId : undefined}
            className="peer size-5 cursor-pointer appearance-none rounded-tag border border-edge bg-surface checked:border-tarn checked:bg-tarn"
          />
          <svg
            aria-hidden="true"
            viewBox="0 0 20 20"
            className="pointer-events-none absolute inset-0 hidden text-surface peer-checked:block"
          >
            <path
              d="m5 10.4 3.400 3.500L15 6.600"
              fill="none"
              stroke="currentColor"
              strokeWidth={2}
              strokeLinecap="round"
              strokeLinejoin="round"
            />
          </svg>
        </span>
        {label}
      </label>
      {hint && (
        <span id={hintId} className="pl-8 text-note text-ink-soft">
          {hint}
        </span>
      )}
    </span>
  );
};
