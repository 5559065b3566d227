import { useFormContext } from 'react-hook-form';
import { Field } from '../../../ui/field';
import { TextInput } from '../../../ui/text-input';
import type { FormQuestion } from '../forms/form-question';
import type { SetName, SpirometryForm } from './spirometry-form';

interface BestValuesFieldsProps {
  set: SetName;
  questions: readonly FormQuestion[];
}

const fields = [
  { id: 'fev1', label: 'FEV1', unit: 'L' },
  { id: 'fvc', label: 'FVC', unit: 'L' },
  { id: 'pef', label: 'PEF', unit: 'L/s' },
  { id: 'fef2575', label: 'FEF25-75', unit: 'L/s' },
] as const;

/** For a report that gives only the best values. */
export const BestValuesFields = ({ set, questions }: BestValuesFieldsProps) => {
  const { register, trigger, getValues, formState } = useFormContext<SpirometryForm>();
  const errors = formState.errors[set]?.best;
  const leave = (): void => {
    const filled = fields.map(({ id }) => `${set}.best.${id}` as const).filter((path) => getValues(path).trim() !== '');
    if (filled.length > 0) void trigger(filled);
  };
  return (
    <div className="grid grid-cols-2 gap-4 row:grid-cols-4">
      {fields.map(({ id, label, unit }) => {
        const path = `${set}.best.${id}` as const;
        const asked = questions.some((question) => question.field === path);
        return (
          <Field
            key={id}
            label={label}
            {...(id === 'fev1' || id === 'fvc' ? {} : { labelNote: 'optional' })}
            error={errors?.[id]?.message}
            question={asked ? 'Asked below' : undefined}
          >
            <TextInput {...register(path, { onBlur: leave })} unit={unit} inputMode="decimal" autoComplete="off" />
          </Field>
        );
      })}
    </div>
  );
};
