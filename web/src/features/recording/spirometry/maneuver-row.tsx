import { formatNumber } from '@slighthill/shared/format';
import { useFormContext, type FieldPath } from 'react-hook-form';
import { rowRatio } from './best-preview';
import { ManeuverCell } from './maneuver-cell';
import type { BlowRow, SetName, SpirometryForm } from './spirometry-form';
import { isEmptyRow } from './test-sets';
import { UsedToggle } from './used-toggle';

interface ManeuverRowProps {
  set: SetName;
  index: number;
  row: BlowRow;
  withFef: boolean;
  bestFev1: boolean;
  bestFvc: boolean;
  askedFields: ReadonlySet<string>;
}

type RowField = Exclude<keyof BlowRow, 'fev1Used' | 'fvcUsed'>;

const names: Record<RowField, string> = {
  fev1: 'FEV1 in L',
  fvc: 'FVC in L',
  pef: 'PEF in L/s',
  fef2575: 'FEF25-75 in L/s',
  time: 'time in s',
  reason: 'note',
};

export const rowErrorId = (set: SetName, index: number): string => `${set}-row-${index}-error`;

/** One blow: eight of them stand numbered, whether used or not. */
export const ManeuverRow = ({ set, index, row, withFef, bestFev1, bestFvc, askedFields }: ManeuverRowProps) => {
  const { formState, trigger } = useFormContext<SpirometryForm>();
  const errors = formState.errors[set]?.rows?.[index];
  const empty = isEmptyRow(row);
  const path = <Field extends keyof BlowRow>(field: Field) => `${set}.rows.${index}.${field}` as const;
  const maneuver = `Maneuver ${index + 1}`;

  /** Checks what stands in the row; what is still empty is only asked for on saving. */
  const leave = (): void => {
    const filled = (['fev1', 'fvc', 'pef', 'fef2575', 'time'] as const).filter((field) => row[field].trim() !== '');
    if (filled.length > 0) void trigger(filled.map((field): FieldPath<SpirometryForm> => path(field)));
  };

  const cell = (
    field: RowField,
    more: { best?: boolean; notUsed?: boolean; left?: boolean; placeholder?: string } = {},
  ) => (
    <ManeuverCell
      path={path(field)}
      name={`${maneuver}, ${names[field]}`}
      column={field}
      row={index}
      asked={askedFields.has(path(field))}
      error={errors?.[field]?.message}
      errorId={rowErrorId(set, index)}
      onLeave={leave}
      {...more}
    />
  );

  const ratio = rowRatio(row.fev1, row.fvc);
  return (
    <tr className="h-8 border-b border-row">
      <th scope="row" className="sticky left-0 z-1 bg-surface pr-2 text-left text-note font-normal text-ink-soft">
        {index + 1}
      </th>
      {/* Room for the focus ring beside the number that stays. */}
      <td className="pl-0.5">{cell('fev1', { best: bestFev1, notUsed: !row.fev1Used })}</td>
      <td>{cell('fvc', { best: bestFvc, notUsed: !row.fvcUsed })}</td>
      <td className="px-2 text-right text-ink-soft">{ratio === null ? '' : formatNumber(ratio, 2)}</td>
      <td>{cell('pef')}</td>
      {withFef && <td>{cell('fef2575')}</td>}
      <td>{cell('time')}</td>
      <td>{!empty && <UsedToggle path={path('fev1Used')} name={`${maneuver}, FEV1 used`} />}</td>
      <td>{!empty && <UsedToggle path={path('fvcUsed')} name={`${maneuver}, FVC used`} />}</td>
      <td>
        {cell('reason', row.fev1Used && row.fvcUsed ? { left: true } : { left: true, placeholder: 'Why not used' })}
      </td>
    </tr>
  );
};
