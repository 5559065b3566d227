import type { ButtonHTMLAttributes, ReactNode, Ref } from 'react';
import { Link, type LinkProps } from 'react-router-dom';
import { cx } from './cx';
import { Icon, type IconName } from './icon';

export type ButtonKind = 'main' | 'second' | 'quiet' | 'danger';
export type ButtonSize = 'row' | 'staff' | 'patient';

const kinds: Record<ButtonKind, string> = {
  main: 'border-transparent bg-tarn text-surface hover:bg-tarn-deep active:bg-tarn-deep',
  second: 'border-rim bg-surface text-ink hover:border-edge hover:bg-mist',
  quiet: 'border-transparent bg-transparent text-tarn hover:bg-tarn-wash hover:text-tarn-deep',
  danger: 'border-rowan bg-surface text-rowan hover:bg-rowan-wash',
};

const sizes: Record<ButtonSize, string> = {
  row: 'min-h-8 px-3 text-body font-semibold rounded-control gap-2',
  staff: 'min-h-9.5 px-4 text-body font-semibold rounded-control gap-2',
  patient: 'min-h-14 px-5 text-p-button rounded-control gap-3',
};

const cannot = 'border-transparent bg-cannot text-ink-soft';

const look = (kind: ButtonKind, size: ButtonSize, disabled: boolean, className?: string): string =>
  cx(
    'inline-flex items-center justify-center border text-center whitespace-nowrap transition-colors duration-120',
    sizes[size],
    disabled ? cannot : kinds[kind],
    kind === 'quiet' && size !== 'patient' && 'px-2',
    className,
  );

interface ButtonProps extends Omit<ButtonHTMLAttributes<HTMLButtonElement>, 'type'> {
  kind?: ButtonKind;
  size?: ButtonSize;
  type?: 'button' | 'submit';
  icon?: IconName;
  /** While true the button keeps its width and focus, shows a turning ring and does nothing when pressed. */
  saving?: boolean;
  savingLabel?: string;
  ref?: Ref<HTMLButtonElement>;
  children: ReactNode;
}

const Turning = () => (
  <svg
    aria-hidden="true"
    viewBox="0 0 20 20"
    width={18}
    height={18}
    className="shrink-0 animate-[turn_900ms_linear_infinite]"
  >
    <circle cx="10" cy="10" r="7" fill="none" stroke="currentColor" strokeOpacity={0.4} strokeWidth={2.4} />
    <path d="M10 3a7 7 0 0 1 7 7" fill="none" stroke="currentColor" strokeWidth={2.4} strokeLinecap="round" />
  </svg>
);

export const Button = ({
  kind = 'second',
  size = 'staff',
  type = 'button',
  icon,
  saving = false,
  savingLabel = 'Saving',
  className,
  children,
  disabled = false,
  onClick,
  ...rest
}: ButtonProps) => (
  <button
    {...rest}
    type={saving ? 'button' : type}
    disabled={disabled}
    aria-disabled={saving || undefined}
    onClick={saving ? undefined : onClick}
    className={look(kind, size, disabled, className)}
  >
    {saving ? <Turning /> : icon && <Icon name={icon} size={18} />}
    {saving ? savingLabel : children}
  </button>
);

interface ButtonLinkProps extends LinkProps {
  kind?: ButtonKind;
  size?: ButtonSize;
  icon?: IconName;
}

/** Goes somewhere, so it is a link; looks like a button because it is the page's next step. */
export const ButtonLink = ({
  kind = 'second',
  size = 'staff',
  icon,
  className,
  children,
  ...rest
}: ButtonLinkProps) => (
  <Link {...rest} className={look(kind, size, false, className)}>
    {icon && <Icon name={icon} size={18} />}
    {children}
  </Link>
);
