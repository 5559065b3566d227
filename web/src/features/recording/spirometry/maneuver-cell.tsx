import type { KeyboardEvent } from 'react';
import { useFormContext, type FieldPath } from 'react-hook-form';
import { cx } from '../../../ui/cx';
import type { SpirometryForm } from './spirometry-form';

interface ManeuverCellProps {
  path: FieldPath<SpirometryForm>;
  /** Spoken name: "Maneuver 4, FEV1 in L". */
  name: string;
  column: string;
  row: number;
  best?: boolean;
  left?: boolean;
  notUsed?: boolean;
  asked?: boolean;
  error?: string | undefined;
  errorId?: string;
  placeholder?: string | undefined;
  onLeave?: () => void;
}

const edge = (error: boolean, asked: boolean): string => {
  if (error) return 'border-rowan ring-1 ring-rowan';
  return asked ? 'border-gorse ring-1 ring-gorse' : 'border-transparent hover:border-edge';
};

/** One number in the grid: Tab goes across, Enter and the arrows go up and down. */
export const ManeuverCell = ({
  path,
  name,
  column,
  row,
  best = false,
  left = false,
  notUsed = false,
  asked = false,
  error,
  errorId,
  placeholder,
  onLeave,
}: ManeuverCellProps) => {
  const { register } = useFormContext<SpirometryForm>();

  const move = (event: KeyboardEvent<HTMLInputElement>): void => {
    const step = event.key === 'Enter' || event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
    if (step === 0) return;
    // Enter never sends the form from inside the grid.
    event.preventDefault();
    const grid = event.currentTarget.closest('table');
    grid?.querySelector<HTMLInputElement>(`[data-cell="${column}-${row + step}"]`)?.focus();
  };

  return (
    <input
      {...register(path, { onBlur: () => onLeave?.() })}
      data-cell={`${column}-${row}`}
      aria-label={name}
      aria-invalid={error ? true : undefined}
      aria-describedby={error ? errorId : undefined}
      inputMode={left ? 'text' : 'decimal'}
      autoComplete="off"
      spellCheck={false}
      placeholder={placeholder}
      onKeyDown={move}
      className={cx(
        'h-8 w-full min-w-0 rounded-cell border px-2',
        left ? 'text-note' : 'text-right',
        edge(error !== undefined, asked),
        best ? 'bg-tarn-wash font-bold' : 'bg-transparent',
        notUsed && 'text-ink-soft line-through',
      )}
    />
  );
};
