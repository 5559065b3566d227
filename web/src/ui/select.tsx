import type { Ref, SelectHTMLAttributes } from 'react';
import { cx } from './cx';
import { controlBox, useFieldControl } from './field-context';
import { Icon } from './icon';

export interface Choice<Value extends string = string> {
  value: Value;
  label: string;
}

interface SelectProps extends SelectHTMLAttributes<HTMLSelectElement> {
  choices: readonly Choice[];
  /** First line that chooses nothing, such as "Choose one". */
  emptyLabel?: string;
  ref?: Ref<HTMLSelectElement> | undefined;
}

/** The platform's own list: it opens as a wheel on a phone and works with every keyboard. */
export const Select = ({ choices, emptyLabel, className, ...rest }: SelectProps) => {
  const { field, controlProps } = useFieldControl();
  return (
    <span className={cx('relative flex', className)}>
      <select
        {...controlProps}
        {...rest}
        className={cx(
          'min-h-10 w-full appearance-none rounded-control border py-2 pr-9 pl-3 text-body text-ink',
          controlBox(field?.state ?? 'plain'),
        )}
      >
        {emptyLabel !== undefined && <option value="">{emptyLabel}</option>}
        {choices.map((choice) => (
          <option key={choice.value} value={choice.value}>
            {choice.label}
          </option>
        ))}
      </select>
      <Icon
        name="down"
        size={16}
        className="pointer-events-none absolute top-1/2 right-3 -translate-y-1/2 text-ink-soft"
      />
    </span>
  );
};
