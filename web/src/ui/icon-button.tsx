import type { ButtonHTMLAttributes, Ref } from 'react';
import { cx } from './cx';
import { Icon, type IconName } from './icon';

interface IconButtonProps extends Omit<ButtonHTMLAttributes<HTMLButtonElement>, 'type' | 'children'> {
  icon: IconName;
  /** The spoken name. Only close and previous/next go without a visible word. */
  label: string;
  ref?: Ref<HTMLButtonElement>;
}

export const IconButton = ({ icon, label, className, ...rest }: IconButtonProps) => (
  <button
    {...rest}
    type="button"
    aria-label={label}
    className={cx(
      'inline-flex size-9 items-center justify-center rounded-control text-ink transition-colors duration-120 hover:bg-mist',
      className,
    )}
  >
    <Icon name={icon} />
  </button>
);
