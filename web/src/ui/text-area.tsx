import type { Ref, TextareaHTMLAttributes } from 'react';
import { cx } from './cx';
import { controlBox, useFieldControl } from './field-context';

interface TextAreaProps extends TextareaHTMLAttributes<HTMLTextAreaElement> {
  ref?: Ref<HTMLTextAreaElement> | undefined;
}

export const TextArea = ({ className, rows = 3, ...rest }: TextAreaProps) => {
  const { field, controlProps } = useFieldControl();
  return (
    <textarea
      {...controlProps}
      rows={rows}
      {...rest}
      className={cx('rounded-control border px-3 py-2 text-body', controlBox(field?.state ?? 'plain'), className)}
    />
  );
};
