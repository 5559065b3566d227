import { formatNumber } from '@slighthill/shared/format';
import { Controller, useFormContext } from 'react-hook-form';
import { formatDayMonth } from '../../../lib/clinic-time';
import { DateTimeInput } from '../../../ui/date-input';
import { Field } from '../../../ui/field';
import { TextArea } from '../../../ui/text-area';
import { BodySizeFields } from '../forms/body-size-fields';
import type { FormQuestion } from '../forms/form-question';
import type { Earlier } from '../forms/number-questions';
import { QuestionList } from '../forms/question-list';
import type { RecordFormState } from '../forms/use-record-form';
import { ConditionFields } from './condition-fields';
import { MeasurePicker } from './measure-picker';
import { measureOfForm, usualConditions, type ResultForm } from './result-form';
import { SafetyItemField } from './safety-item-field';
import { ValueField } from './value-field';

interface ResultFieldsProps {
  state: RecordFormState<ResultForm>;
  earlierHeight: Earlier | null;
  amending: boolean;
}

const carriedHint = (earlier: Earlier | null): string =>
  earlier
    ? `Left empty, ${formatNumber(earlier.value, 1)} cm from ${formatDayMonth(earlier.on)} is used if it is at most 12 months old`
    : 'Without a height there is no percent predicted';

/** One form for every measure that is entered as one number; the registry says what it asks. */
export const ResultFields = ({ state, earlierHeight, amending }: ResultFieldsProps) => {
  const { control, register, setValue, formState } = useFormContext<ResultForm>();
  const { values, questions } = state;
  const measure = measureOfForm(values);
  const valueAsked = questions.some(({ field }) => field === 'value');
  return (
    <>
      <div className="grid gap-x-4 gap-y-3 row:grid-cols-2">
        {!amending && (
          <Field label="Result" error={formState.errors.measure?.message} hint="Type a part of its name">
            <Controller
              control={control}
              name="measure"
              render={({ field }) => (
                <MeasurePicker
                  ref={field.ref}
                  value={field.value}
                  onChoose={(id) => {
                    field.onChange(id);
                    setValue('conditions', usualConditions(id), { shouldDirty: true });
                    if (id !== values.measure) setValue('value', '', { shouldDirty: true });
                    state.goTo('value');
                  }}
                />
              )}
            />
          </Field>
        )}
        <Field label="Date and time" error={formState.errors.takenAt?.message}>
          <DateTimeInput {...register('takenAt')} />
        </Field>
      </div>
      {measure && (
        <>
          <div key={measure.id} className="grid gap-x-4 gap-y-3 row:grid-cols-2">
            <div className={measure.gradeDescriptions ? 'row:col-span-2' : undefined}>
              <ValueField measure={measure} asked={valueAsked} />
            </div>
            {measure.safetyItem && <SafetyItemField item={measure.safetyItem} />}
            <ConditionFields measure={measure} />
          </div>
          {measure.referenceKind && (
            <div className="grid gap-x-4 gap-y-3 row:grid-cols-3">
              <BodySizeFields questions={questions} heightHint={carriedHint(earlierHeight)} />
            </div>
          )}
          <QuestionList
            questions={questions}
            onFix={state.fix}
            onStand={state.stand}
            onChangeIt={(question: FormQuestion) => state.goTo(question.field)}
          />
          <Field label="Note" labelNote="optional" error={formState.errors.note?.message}>
            <TextArea {...register('note')} rows={2} />
          </Field>
        </>
      )}
    </>
  );
};
