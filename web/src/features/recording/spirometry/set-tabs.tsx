import { Tabs } from 'radix-ui';
import type { ReactNode } from 'react';
import { useFormContext } from 'react-hook-form';
import { Checkbox } from '../../../ui/checkbox';
import { cx } from '../../../ui/cx';
import { ChartMark } from '../../../charts/chart-mark';
import type { SetName, SpirometryForm } from './spirometry-form';
import { setsOf, setWords } from './test-sets';

interface SetTabsProps {
  values: SpirometryForm;
  tab: SetName;
  onTab: (set: SetName) => void;
  children: (set: SetName, title: string) => ReactNode;
}

const titles: Record<SetName, string> = { before: 'Before bronchodilator', after: 'After bronchodilator' };

/** What the other way of entering holds stays where it is. */
const BestOnly = ({ set, values }: { set: SetName; values: SpirometryForm }) => {
  const { setValue } = useFormContext<SpirometryForm>();
  return (
    <Checkbox
      label="Best values only"
      checked={values[set].entry === 'best'}
      onChange={(event) => setValue(`${set}.entry`, event.target.checked ? 'best' : 'maneuvers', { shouldDirty: true })}
    />
  );
};

/** Before and After carry the chart's own marks; one test alone needs no tabs. */
export const SetTabs = ({ values, tab, onTab, children }: SetTabsProps) => {
  const sets = setsOf(values.state);
  if (sets.length === 1)
    return (
      <div className="flex flex-col gap-2">
        <BestOnly set={tab} values={values} />
        {children(tab, 'Maneuvers')}
      </div>
    );
  return (
    <Tabs.Root value={tab} onValueChange={(value) => onTab(value as SetName)}>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
        <Tabs.List
          aria-label="Before or after bronchodilator"
          className="grid flex-1 basis-80 grid-cols-2 gap-1 rounded-control border border-rim bg-surface p-1"
        >
          {sets.map((set) => (
            <Tabs.Trigger
              key={set}
              value={set}
              className={cx(
                'flex min-h-9 items-center gap-2 rounded-cell px-2.5 text-left',
                set === tab ? 'bg-tarn-wash' : 'hover:bg-mist',
              )}
            >
              <svg aria-hidden="true" width={14} height={14} viewBox="0 0 14 14" className="shrink-0">
                <ChartMark kind={set === 'before' ? 'open' : 'filled'} x={7} y={7} />
              </svg>
              <span className="flex min-w-0 flex-wrap items-baseline gap-x-2">
                <span className="font-semibold">{titles[set]}</span>
                <span className="text-note text-ink-soft">{setWords(values[set])}</span>
              </span>
            </Tabs.Trigger>
          ))}
        </Tabs.List>
        <BestOnly set={tab} values={values} />
      </div>
      {sets.map((set) => (
        <Tabs.Content key={set} value={set} tabIndex={-1} className="mt-2">
          {children(set, titles[set])}
        </Tabs.Content>
      ))}
    </Tabs.Root>
  );
};
