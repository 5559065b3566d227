import { safetyItems, type SafetyItemId } from '@slighthill/shared/safety-checklist';
import { Controller, useFormContext } from 'react-hook-form';
import { RadioGroup } from '../../../ui/radio-group';
import type { FileForm } from './file-form';

const groups = [
  { severity: 'absolute', legend: 'Bars exercise until a pulmonologist releases it' },
  { severity: 'relative', legend: 'Ask the pulmonologist first' },
] as const;

const choicesOf = (severity: 'absolute' | 'relative'): { value: SafetyItemId; label: string }[] =>
  safetyItems.filter((item) => item.severity === severity).map(({ id, label }) => ({ value: id, label }));

/** The checklist, the items that bar exercise first. */
export const HoldField = () => {
  const { control, formState } = useFormContext<FileForm>();
  return (
    <Controller
      control={control}
      name="item"
      render={({ field }) => (
        <div className="flex flex-col gap-4 row:col-span-2">
          {groups.map(({ severity, legend }, index) => (
            <RadioGroup<SafetyItemId>
              key={severity}
              name={field.name}
              legend={<span className="font-semibold">{legend}</span>}
              arrange="list"
              choices={choicesOf(severity)}
              value={field.value === '' ? null : (field.value as SafetyItemId)}
              onValueChange={field.onChange}
              error={index === 0 ? formState.errors.item?.message : undefined}
            />
          ))}
          <p className="text-note text-ink-soft">
            A hold stays in the record until a pulmonologist releases it with a reason. Local protocol and the treating
            clinician decide.
          </p>
        </div>
      )}
    />
  );
};
