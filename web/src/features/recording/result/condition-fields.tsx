import type { Condition, Measure } from '@slighthill/shared/measures';
import { Controller, useFormContext } from 'react-hook-form';
import { Field } from '../../../ui/field';
import { RadioGroup } from '../../../ui/radio-group';
import { Select } from '../../../ui/select';
import { TextInput } from '../../../ui/text-input';
import type { ResultForm } from './result-form';

interface ConditionFieldsProps {
  measure: Measure;
}

const choicesOf = (condition: Condition) =>
  (condition.choices ?? []).map((value, index) => ({ value, label: condition.choiceLabels?.[index] ?? value }));

const yesNo = [
  { value: 'yes', label: 'Yes' },
  { value: 'no', label: 'No' },
] as const;

const hintOf = (condition: Condition): string | undefined =>
  condition.onDifference === 'blocks' ? 'Results that differ in this are not compared' : undefined;

/** The circumstances the registry declares for this measure, whatever they are. */
export const ConditionFields = ({ measure }: ConditionFieldsProps) => {
  const { control, register, formState } = useFormContext<ResultForm>();
  return Object.entries(measure.conditions).map(([key, condition]) => {
    const path = `conditions.${key}` as const;
    const error = formState.errors.conditions?.[key]?.message;
    if (condition.type === 'boolean')
      return (
        <Controller
          key={key}
          control={control}
          name={path}
          render={({ field }) => (
            <RadioGroup
              name={field.name}
              legend={condition.label}
              choices={yesNo}
              value={field.value === 'yes' || field.value === 'no' ? field.value : null}
              onValueChange={field.onChange}
              hint={hintOf(condition)}
              error={error}
            />
          )}
        />
      );
    return (
      <Field key={key} label={condition.label} hint={hintOf(condition)} error={error}>
        {condition.type === 'choice' ? (
          <Select
            {...register(path)}
            choices={choicesOf(condition)}
            {...(condition.default === null ? { emptyLabel: 'Not stated' } : {})}
          />
        ) : (
          <TextInput {...register(path)} unit={condition.unit} inputMode="decimal" autoComplete="off" />
        )}
      </Field>
    );
  });
};
