import type { HeightMethod } from '@slighthill/shared/contracts/common';
import { useFormContext } from 'react-hook-form';
import { Field } from '../../../ui/field';
import { Select } from '../../../ui/select';
import { TextInput } from '../../../ui/text-input';
import type { FormQuestion } from './form-question';
import { heightMethodChoices } from './height-methods';

interface BodyForm {
  heightCm: string;
  heightMethod: HeightMethod;
  weightKg: string;
}

interface BodySizeFieldsProps {
  questions: readonly FormQuestion[];
  heightHint?: string;
}

/** Height, how it was found, and weight: of any form that has these three fields. */
export const BodySizeFields = ({ questions, heightHint = 'Without shoes, to 0.1 cm' }: BodySizeFieldsProps) => {
  const { register, getValues, trigger, formState } = useFormContext<BodyForm>();
  const { errors } = formState;
  const asked = (name: string): string | undefined =>
    questions.some(({ field }) => field === name) ? 'Asked below' : undefined;
  const check = (name: 'heightCm' | 'weightKg') => ({
    onBlur: () => {
      if (getValues(name).trim() !== '') void trigger(name);
    },
  });
  return (
    <>
      <Field
        label="Height"
        labelNote="optional"
        hint={heightHint}
        error={asked('heightCm') ? undefined : errors.heightCm?.message}
        question={asked('heightCm')}
      >
        <TextInput {...register('heightCm', check('heightCm'))} unit="cm" inputMode="decimal" autoComplete="off" />
      </Field>
      <Field label="Height is" error={errors.heightMethod?.message}>
        <Select {...register('heightMethod')} choices={heightMethodChoices} />
      </Field>
      <Field label="Weight" labelNote="optional" error={errors.weightKg?.message} question={asked('weightKg')}>
        <TextInput {...register('weightKg', check('weightKg'))} unit="kg" inputMode="decimal" autoComplete="off" />
      </Field>
    </>
  );
};
