import { useEffect, useEffectEvent, useMemo, useRef } from 'react';
import {
  useForm,
  useWatch,
  type DefaultValues,
  type FieldPath,
  type FieldValues,
  type UseFormReturn,
} from 'react-hook-form';
import { useDebounced } from '../../../lib/use-debounced';
import { resolverFor, type FormIssue } from './form-issues';
import { openQuestions, type FormQuestion } from './form-question';
import { useGoTo } from './use-go-to';
import { useSettledQuestions } from './use-questions';

/** Keys of the questions answered with "it is right" are part of every form, so that a draft keeps them. */
export interface AskingForm extends FieldValues {
  answered: string[];
}

export interface RecordFormState<Form extends AskingForm> {
  form: UseFormReturn<Form>;
  values: Form;
  /** Open questions whose value has settled. */
  questions: FormQuestion[];
  /** Every open question, as typed this moment; saving waits for these. */
  openNow: () => FormQuestion[];
  goTo: (field: string) => void;
  fix: (question: FormQuestion, value: string) => void;
  stand: (question: FormQuestion) => void;
}

interface RecordFormSource<Form extends AskingForm> {
  start: Form;
  /** What stands against sending the form; must keep its identity between renders. */
  check: (form: Form) => readonly FormIssue[];
  ask: (form: Form) => FormQuestion[];
  /** Draws a field that is out of sight before the focus goes to it. */
  reveal?: (field: string) => void;
}

/** The form, the questions it asks and where the focus goes. */
export const useRecordForm = <Form extends AskingForm>({
  start,
  check,
  ask,
  reveal,
}: RecordFormSource<Form>): RecordFormState<Form> => {
  const resolver = useMemo(() => resolverFor<Form>(check), [check]);
  const form = useForm<Form>({ defaultValues: start as DefaultValues<Form>, resolver, shouldFocusError: false });
  const { control, getValues, setFocus, setValue, trigger, formState } = form;
  // Every field has a default, so that what is watched is the whole form.
  const values = useWatch({ control }) as Form;
  const goTo = useGoTo((field) => {
    setFocus(field as FieldPath<Form>);
    // A group of radio buttons has no field of its own to focus: its first button stands for it.
    const named = document.getElementsByName(field)[0];
    if (named && document.activeElement?.getAttribute('name') !== field) named.focus();
  }, reveal);
  const questions = useSettledQuestions(ask(values), values.answered);

  const settled = useDebounced(values, 300);
  const { submitCount } = formState;
  const sent = useRef('');
  const remember = useEffectEvent(() => {
    sent.current = JSON.stringify(values);
  });
  useEffect(() => remember(), [submitCount]);
  const follow = useEffectEvent(() => {
    // After a refused save the marks follow what is typed; what the server marked stays until something changes.
    if (submitCount > 0 && JSON.stringify(settled) !== sent.current && settled === values) void trigger();
  });
  useEffect(() => follow(), [settled]);

  const put = (path: string, value: unknown): void =>
    setValue(path as FieldPath<Form>, value as never, { shouldDirty: true, shouldTouch: true });

  return {
    form,
    values,
    questions,
    openNow: () => openQuestions(ask(getValues()), getValues().answered),
    goTo,
    fix: (question, value) => {
      put(question.field, value);
      goTo(question.field);
    },
    stand: (question) => {
      put('answered', [...getValues().answered, question.key]);
      goTo(question.field);
    },
  };
};
