import { formatNumber } from '@slighthill/shared/format';
import { getMeasure } from '@slighthill/shared/measures';
import { useFormContext } from 'react-hook-form';
import { formatDayMonth } from '../../../lib/clinic-time';
import { DateTimeInput } from '../../../ui/date-input';
import { Field } from '../../../ui/field';
import { TextArea } from '../../../ui/text-area';
import { BodySizeFields } from '../forms/body-size-fields';
import type { Earlier } from '../forms/number-questions';
import { QuestionList } from '../forms/question-list';
import type { RecordFormState } from '../forms/use-record-form';
import { typedBmi, type BodySizeForm } from './body-size-form';

interface BodySizeBodyProps {
  state: RecordFormState<BodySizeForm>;
  earlierHeight: Earlier | null;
}

export const BodySizeBody = ({ state, earlierHeight }: BodySizeBodyProps) => {
  const { register, formState } = useFormContext<BodySizeForm>();
  const { values, questions } = state;
  const bmi = typedBmi(values, earlierHeight);
  const carried = values.heightCm.trim() === '' ? earlierHeight : null;
  return (
    <>
      <div className="grid gap-x-4 gap-y-3 row:grid-cols-2">
        <Field label="Date and time" error={formState.errors.takenAt?.message}>
          <DateTimeInput {...register('takenAt')} />
        </Field>
      </div>
      <div className="grid gap-x-4 gap-y-3 row:grid-cols-3">
        <BodySizeFields questions={questions} />
      </div>
      <QuestionList
        questions={questions}
        onFix={state.fix}
        onStand={state.stand}
        onChangeIt={(question) => state.goTo(question.field)}
      />
      <p className="rounded-control bg-mist px-4 py-3" role="status">
        <span className="text-ink-soft">Body mass index </span>
        <strong>
          {bmi === null
            ? 'not yet'
            : `${formatNumber(bmi, getMeasure('bmi').decimals)} ${getMeasure('bmi').unit.symbol}`}
        </strong>
        {bmi !== null && carried && (
          <span className="text-note text-ink-soft">
            {` with ${formatNumber(carried.value, 1)} cm from ${formatDayMonth(carried.on)}`}
          </span>
        )}
      </p>
      <Field label="Note" labelNote="optional" error={formState.errors.note?.message}>
        <TextArea {...register('note')} rows={2} />
      </Field>
    </>
  );
};
