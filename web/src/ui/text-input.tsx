import type { InputHTMLAttributes, Ref } from 'react';
import { cx } from './cx';
import { controlBox, useFieldControl } from './field-context';

interface TextInputProps extends Omit<InputHTMLAttributes<HTMLInputElement>, 'size'> {
  /** Shown inside the field's right edge. */
  unit?: string | undefined;
  size?: 'staff' | 'patient';
  ref?: Ref<HTMLInputElement> | undefined;
}

export const TextInput = ({ unit, size = 'staff', className, readOnly, type = 'text', ...rest }: TextInputProps) => {
  const { field, controlProps } = useFieldControl();
  return (
    <span
      className={cx(
        'flex items-center rounded-control border transition-colors duration-120',
        'focus-within:outline-3 focus-within:outline-offset-2 focus-within:outline-tarn',
        size === 'patient' ? 'min-h-13 text-p-body' : 'min-h-10 text-body',
        controlBox(field?.state ?? 'plain', readOnly),
        className,
      )}
    >
      <input
        {...controlProps}
        {...rest}
        type={type}
        readOnly={readOnly}
        className="min-w-0 flex-1 rounded-control bg-transparent px-3 py-2 outline-none"
      />
      {unit && (
        <span aria-hidden="true" className="pr-3 text-note text-ink-soft">
          {unit}
        </span>
      )}
    </span>
  );
};
