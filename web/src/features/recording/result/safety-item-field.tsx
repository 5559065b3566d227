import type { SafetyItem } from '@slighthill/shared/measures';
import { Controller, useFormContext } from 'react-hook-form';
import { Icon } from '../../../ui/icon';
import { RadioGroup } from '../../../ui/radio-group';
import type { ResultForm } from './result-form';

interface SafetyItemFieldProps {
  item: SafetyItem;
}

/** Positive from the registry's limit on; a missing answer counts like one. */
export const isFlagged = (item: SafetyItem, answer: string): boolean =>
  answer !== '' && !(Number(answer) < item.positiveFrom);

const words = (choice: string): string => (choice === 'not-answered' ? 'Not answered' : choice);

/** One answer that is seen by itself, whatever the total (rule OM-1). */
export const SafetyItemField = ({ item }: SafetyItemFieldProps) => {
  const { control, formState } = useFormContext<ResultForm>();
  return (
    <Controller
      control={control}
      name="item9"
      render={({ field }) => (
        <div className="flex flex-col gap-2 row:col-span-2">
          <RadioGroup
            name={field.name}
            legend={item.label}
            choices={item.choices.map((value) => ({ value, label: words(value) }))}
            value={field.value === '' ? null : field.value}
            onValueChange={field.onChange}
            error={formState.errors.item9?.message}
            hint="Any answer but 0, and a missing one, is saved and flagged in the record at once."
          />
          <div role="status">
            {isFlagged(item, field.value) && (
              <p className="flex items-start gap-2 rounded-control bg-rowan-wash px-4 py-3 text-rowan-ink">
                <Icon name="alert" />
                <span>
                  <strong>Saving raises a safety flag.</strong> It stays in the record’s header until a pulmonologist or
                  a therapist resolves it. Follow your clinic’s safety protocol now.
                </span>
              </p>
            )}
          </div>
        </div>
      )}
    />
  );
};
