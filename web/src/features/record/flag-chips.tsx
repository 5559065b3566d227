import { Popover } from 'radix-ui';
import { useEffect, useState } from 'react';
import type { Flag, Patient } from '@slighthill/shared/contracts/patient';
import { cx } from '../../ui/cx';
import { Icon, type IconName } from '../../ui/icon';
import { useOverlayRoot } from '../../ui/overlay-root';
import { FlagDetail } from './flag-detail';

interface FlagChipsProps {
  patient: Pick<Patient, 'id' | 'openFlags' | 'abilities'>;
  /** Takes the focus when the chip that had it is gone. */
  onGone: () => void;
}

const looks: Record<Flag['severity'], { tone: string; icon: IconName }> = {
  safety: { tone: 'bg-rowan-wash text-rowan', icon: 'alert' },
  attention: { tone: 'bg-gorse-wash text-gorse', icon: 'note' },
};

interface FlagChipProps {
  words: string;
  flags: readonly Flag[];
  patient: FlagChipsProps['patient'];
  onResolved: (flagId: string) => void;
}

const FlagChip = ({ words, flags, patient, onResolved }: FlagChipProps) => {
  const container = useOverlayRoot();
  const [open, setOpen] = useState(false);
  const { tone, icon } = looks[flags.some((flag) => flag.severity === 'safety') ? 'safety' : 'attention'];
  return (
    <Popover.Root open={open} onOpenChange={setOpen}>
      <Popover.Trigger
        className={cx(
          'inline-flex min-h-8 items-center gap-2 rounded-chip px-3 text-note font-semibold whitespace-nowrap',
          tone,
        )}
      >
        <Icon name={icon} size={16} />
        {words}
      </Popover.Trigger>
      <Popover.Portal container={container}>
        <Popover.Content
          align="end"
          sideOffset={6}
          collisionPadding={12}
          aria-label={words}
          className="z-40 flex max-h-[70dvh] w-88 max-w-[calc(100vw-24px)] animate-[appear_120ms_ease-out] flex-col gap-5 overflow-y-auto rounded-sheet border border-line bg-surface p-4 shadow-reader"
        >
          {flags.map((flag) => (
            <FlagDetail
              key={flag.id}
              flag={flag}
              patientId={patient.id}
              canResolve={patient.abilities.includes('resolve-flag')}
              onResolved={() => {
                setOpen(false);
                onResolved(flag.id);
              }}
            />
          ))}
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
};

/** A resolved flag's chip leaves the page with the focus in it. */
const useFocusAfterResolving = (openFlags: readonly Flag[], onGone: () => void) => {
  const [resolved, setResolved] = useState<string | null>(null);
  const gone = resolved !== null && openFlags.every((flag) => flag.id !== resolved);
  useEffect(() => {
    if (!gone) return undefined;
    const timer = window.setTimeout(() => {
      setResolved(null);
      if (document.activeElement === document.body) onGone();
    });
    return () => window.clearTimeout(timer);
  }, [gone, onGone]);
  return setResolved;
};

const shownAtMost = 3;

/** Open flags, safety first; more than three become "2 more". */
export const FlagChips = ({ patient, onGone }: FlagChipsProps) => {
  const onResolved = useFocusAfterResolving(patient.openFlags, onGone);
  const flags = [...patient.openFlags].sort(
    (a, b) => Number(b.severity === 'safety') - Number(a.severity === 'safety'),
  );
  if (flags.length === 0) return null;
  const shown = flags.length > shownAtMost ? flags.slice(0, shownAtMost - 1) : flags;
  const rest = flags.slice(shown.length);
  return (
    <ul aria-label="Open flags" className="flex flex-wrap gap-x-2 gap-y-1">
      {shown.map((flag) => (
        <li key={flag.id}>
          <FlagChip words={flag.label} flags={[flag]} patient={patient} onResolved={onResolved} />
        </li>
      ))}
      {rest.length > 0 && (
        <li>
          <FlagChip words={`${rest.length} more`} flags={rest} patient={patient} onResolved={onResolved} />
        </li>
      )}
    </ul>
  );
};
