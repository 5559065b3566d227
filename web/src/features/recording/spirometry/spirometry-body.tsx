import { formatNumber } from '@slighthill/shared/format';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { formatDayMonth } from '../../../lib/clinic-time';
import { Field } from '../../../ui/field';
import { TextArea } from '../../../ui/text-area';
import { TextInput } from '../../../ui/text-input';
import type { FormQuestion } from '../forms/form-question';
import type { Earlier } from '../forms/number-questions';
import { QuestionList } from '../forms/question-list';
import { SetContent } from './set-content';
import { SetTabs } from './set-tabs';
import { SpirometryFields } from './spirometry-fields';
import { setOfField } from './spirometry-questions';
import { SpirometryResult } from './spirometry-result';
import type { SpirometryFormState } from './use-spirometry-form';

interface SpirometryBodyProps {
  state: SpirometryFormState;
  patient: Patient;
  earlierHeight: Earlier | null;
  amending: boolean;
}

/** The whole of the form between the drawer's head and foot; the same for a new test and an amended one. */
export const SpirometryBody = ({ state, patient, earlierHeight, amending }: SpirometryBodyProps) => {
  const { form, values, questions, tab } = state;
  const { register, formState } = form;
  const aboutHeight = questions.filter(({ field }) => field === 'heightCm');
  const above = questions.filter(({ field }) => field !== 'heightCm' && setOfField(field) === null);
  const answers = {
    onFix: state.fix,
    onStand: state.stand,
    onChangeIt: (question: FormQuestion) => state.goTo(question.field),
  };
  const heightNote = (): string => {
    return earlierHeight
      ? `Until you answer, percent predicted uses ${formatNumber(earlierHeight.value, 1)} cm from ${formatDayMonth(earlierHeight.on)}.`
      : 'Until you answer there is no percent predicted.';
  };

  return (
    <>
      <SpirometryFields
        values={values}
        questions={questions}
        amending={amending}
        heightQuestion={
          aboutHeight.length > 0 && <QuestionList questions={aboutHeight} noteOf={heightNote} {...answers} />
        }
      />
      <QuestionList questions={above} {...answers} />
      <SetTabs values={values} tab={tab} onTab={state.setTab}>
        {(set, title) => (
          <div className="flex flex-col gap-3">
            <SetContent set={set} title={title} values={values} questions={questions} />
            <QuestionList questions={questions.filter(({ field }) => setOfField(field) === set)} {...answers} />
          </div>
        )}
      </SetTabs>
      <SpirometryResult patient={patient} values={values} earlierHeight={earlierHeight} questions={questions} />
      <div className="grid gap-x-4 gap-y-3 row:grid-cols-[1fr_2fr]">
        <Field
          label="Own bronchodilator"
          labelNote="optional"
          hint="Hours since the last dose taken at home"
          error={formState.errors.ownHoursAgo?.message}
        >
          <TextInput {...register('ownHoursAgo')} unit="hours" inputMode="decimal" autoComplete="off" />
        </Field>
        <Field label="Note" labelNote="optional" error={formState.errors.note?.message}>
          <TextArea {...register('note')} rows={2} />
        </Field>
      </div>
    </>
  );
};
