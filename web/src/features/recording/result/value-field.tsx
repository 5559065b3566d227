import type { Measure } from '@slighthill/shared/measures';
import { Controller, useFormContext } from 'react-hook-form';
import { Field } from '../../../ui/field';
import { RadioGroup } from '../../../ui/radio-group';
import { TextInput } from '../../../ui/text-input';
import type { ResultForm } from './result-form';
import { unitBeside } from './unit-beside';

interface ValueFieldProps {
  measure: Measure;
  asked: boolean;
}

/** The result itself: a number with its unit, or a grade chosen by its short description. */
export const ValueField = ({ measure, asked }: ValueFieldProps) => {
  const { control, register, trigger, getValues, formState } = useFormContext<ResultForm>();
  const error = formState.errors.value?.message;
  if (measure.gradeDescriptions)
    return (
      <Controller
        control={control}
        name="value"
        render={({ field }) => (
          <RadioGroup
            name={field.name}
            legend={measure.label}
            arrange="list"
            hint={measure.hint}
            error={error}
            choices={measure.gradeDescriptions!.map((words, grade) => ({
              value: String(grade),
              label: `${grade}  ${words}`,
            }))}
            value={field.value === '' ? null : field.value}
            onValueChange={field.onChange}
          />
        )}
      />
    );
  return (
    <Field label={measure.label} hint={measure.hint} error={error} question={asked ? 'Asked below' : undefined}>
      <TextInput
        {...register('value', {
          onBlur: () => {
            if (getValues('value').trim() !== '') void trigger('value');
          },
        })}
        unit={unitBeside(measure) || undefined}
        inputMode="decimal"
        autoComplete="off"
      />
    </Field>
  );
};
