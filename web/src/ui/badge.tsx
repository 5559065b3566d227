import type { ReactNode } from 'react';
import { cx } from './cx';
import { Icon, type IconName } from './icon';

export type BadgeTone = 'plain' | 'good' | 'attention' | 'danger' | 'signature' | 'chosen';

const tones: Record<BadgeTone, string> = {
  plain: 'bg-mist text-ink-soft',
  good: 'bg-fern-wash text-fern',
  attention: 'bg-gorse-wash text-gorse',
  danger: 'bg-rowan-wash text-rowan',
  signature: 'bg-mist text-heather',
  chosen: 'bg-tarn-wash text-tarn-deep',
};

interface BadgeProps {
  tone?: BadgeTone;
  icon?: IconName;
  children: ReactNode;
}

/** A state in words; the color only repeats it. */
export const Badge = ({ tone = 'plain', icon, children }: BadgeProps) => (
  <span
    className={cx(
      '-my-1 inline-flex min-h-6 items-center gap-1.5 rounded-chip px-2.5 text-note font-semibold whitespace-nowrap',
      tones[tone],
    )}
  >
    {icon && <Icon name={icon} size={16} />}
    {children}
  </span>
);
