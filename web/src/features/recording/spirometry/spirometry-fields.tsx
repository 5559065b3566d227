import type { ReactNode } from 'react';
import { useFormContext, type FieldPath } from 'react-hook-form';
import { DateTimeInput } from '../../../ui/date-input';
import { Field } from '../../../ui/field';
import { Select } from '../../../ui/select';
import { TextInput } from '../../../ui/text-input';
import type { FormQuestion } from '../forms/form-question';
import { heightMethodChoices } from '../forms/height-methods';
import type { FormState, SpirometryForm } from './spirometry-form';
import { withState } from './test-sets';

interface SpirometryFieldsProps {
  values: SpirometryForm;
  questions: readonly FormQuestion[];
  amending: boolean;
  /** What is asked about the height, drawn under its row. */
  heightQuestion: ReactNode;
}

const labels: Record<FormState, string> = {
  given: 'Given in this test',
  before: 'Before bronchodilator',
  after: 'After bronchodilator',
  none: 'None given',
  unknown: 'Not stated',
};

const choices = (states: readonly FormState[]) => states.map((value) => ({ value, label: labels[value] }));
const drugs = ['Albuterol', 'Levalbuterol', 'Ipratropium', 'Albuterol and ipratropium'];

/** On a wide page the question stands between the height's row and the next. */
const below = 'row:order-2';

/** When, at what height and weight, and what was given: above the tabs. */
export const SpirometryFields = ({ values, questions, amending, heightQuestion }: SpirometryFieldsProps) => {
  const { register, reset, setValue, getValues, trigger, formState } = useFormContext<SpirometryForm>();
  const { errors } = formState;
  const asked = (field: string): string | undefined =>
    questions.some((question) => question.field === field) ? 'Asked below' : undefined;
  const given = values.state === 'given' || values.state === 'after';
  const states: FormState[] = amending ? ['before', 'after', 'none', 'unknown'] : ['given', 'none', 'unknown'];
  const check = (field: FieldPath<SpirometryForm>) => ({
    onBlur: () => {
      if (getValues(field) !== '') void trigger(field);
    },
  });

  return (
    <div className="grid grid-cols-2 gap-x-4 gap-y-3 row:grid-cols-[1.6fr_1fr_1.1fr_1fr]">
      <Field label="Date and time" error={errors.performedAt?.message} className="max-row:col-span-2">
        <DateTimeInput {...register('performedAt', check('performedAt'))} />
      </Field>
      <Field
        label="Height"
        error={asked('heightCm') ? undefined : errors.heightCm?.message}
        question={asked('heightCm')}
        hint="To 0.1 cm"
      >
        <TextInput {...register('heightCm', check('heightCm'))} unit="cm" inputMode="decimal" autoComplete="off" />
      </Field>
      <Field label="Height is" error={errors.heightMethod?.message}>
        <Select {...register('heightMethod')} choices={heightMethodChoices} />
      </Field>
      {heightQuestion && (
        <div className="relative col-span-full before:absolute before:-top-1.5 before:left-6 before:size-4 before:rotate-45 before:bg-gorse-wash row:order-1 row:before:left-[calc((100%-48px)*0.34+40px)]">
          {heightQuestion}
        </div>
      )}
      <Field label="Weight" labelNote="optional" error={errors.weightKg?.message} question={asked('weightKg')}>
        <TextInput {...register('weightKg', check('weightKg'))} unit="kg" inputMode="decimal" autoComplete="off" />
      </Field>
      <Field label="Bronchodilator" error={errors.state?.message} className={`max-row:col-span-2 ${below}`}>
        <Select
          {...register('state')}
          choices={choices(states)}
          onChange={(event) => {
            const state = event.target.value as FormState;
            // A corrected state of one test takes its numbers along; the typed text of every cell stays as it was.
            if (amending)
              reset(withState(getValues(), state), {
                keepDefaultValues: true,
                keepIsSubmitted: true,
                keepTouched: true,
              });
            else setValue('state', state, { shouldDirty: true });
          }}
        />
      </Field>
      {given && (
        <>
          <Field label="Drug" error={errors.drug?.message} className={below}>
            <TextInput {...register('drug')} list="bronchodilator-drugs" autoComplete="off" />
          </Field>
          <Field label="Dose" error={errors.doseMcg?.message} className={below}>
            <TextInput
              {...register('doseMcg', check('doseMcg'))}
              unit={'\u00b5g'}
              inputMode="decimal"
              autoComplete="off"
            />
          </Field>
          <Field label="Since the dose" error={errors.minutesSinceDose?.message} className={below}>
            <TextInput
              {...register('minutesSinceDose', check('minutesSinceDose'))}
              unit="min"
              inputMode="numeric"
              autoComplete="off"
            />
          </Field>
          <datalist id="bronchodilator-drugs">
            {drugs.map((drug) => (
              <option key={drug} value={drug} />
            ))}
          </datalist>
        </>
      )}
    </div>
  );
};
