import { useState, type FormEvent } from 'react';
import type { DraftForm } from '@slighthill/shared/contracts/draft';
import type { FieldPath } from 'react-hook-form';
import { useUnsavedWork, type UnsavedWork } from '../../../ui/use-unsaved-work';
import { useSaveAboutPatient } from '../mutations';
import type { FormIssue } from './form-issues';
import { isStale, mayWorkAgain, saveProblem } from './save-problem';
import { useDraftKeeper, type DraftKeeper } from './use-draft-keeper';
import type { AskingForm, RecordFormState } from './use-record-form';

interface SendRequest {
  path: string;
  body: unknown;
  /** Where the server's message about a part of the body belongs in the form; null for what has no field. */
  toFormPath: (path: string) => string | null;
}

interface RecordDrawerSource<Form extends AskingForm, Answer> {
  patientId: string;
  state: RecordFormState<Form>;
  check: (form: Form) => readonly FormIssue[];
  /** Drafts are kept under the patient; null keeps none. */
  draftForm: DraftForm | null;
  restoredAt: string | null;
  request: (form: Form) => SendRequest;
  onSaved: (answer: Answer) => void;
  /** The form for one more entry in the same sitting, and what is done once this one is saved. */
  another?: { next: (saved: Form) => Form; onSaved: (answer: Answer) => void; firstField: string };
  /** Someone changed the entry since it was opened: get the newest, keep what is typed. */
  onStale?: () => void;
  /** What the person typed, in words: "numbers". */
  kept?: string;
}

export interface RecordDrawerState {
  problem: string | null;
  draft: DraftKeeper;
  work: UnsavedWork;
  saving: boolean;
  submit: (event?: FormEvent) => void;
  submitAndGoOn: () => void;
  /** The same again may work: nothing typed stands against it. */
  mayRetry: boolean;
  /** Keeps the draft; says whether the drawer may close and when there is a draft since. */
  keep: () => Promise<{ mayClose: boolean; keptAt: string | null }>;
}

/** What every drawer does: keep a draft, go to what is open, save once, and lose nothing when saving fails. */
export const useRecordDrawer = <Form extends AskingForm, Answer>(
  source: RecordDrawerSource<Form, Answer>,
): RecordDrawerState => {
  const {
    patientId,
    state,
    check,
    draftForm,
    restoredAt,
    request,
    onSaved,
    another,
    onStale,
    kept = 'numbers',
  } = source;
  const { form, values, goTo } = state;
  const [problem, setProblem] = useState<string | null>(null);
  const [mayRetry, setMayRetry] = useState(false);
  const typedSomething = form.formState.isDirty;
  const draft = useDraftKeeper({
    form: draftForm ?? 'measurement',
    subject: patientId,
    values,
    enabled: draftForm !== null && typedSomething,
    restoredAt,
  });
  const work = useUnsavedWork(typedSomething && !draft.current);
  const save = useSaveAboutPatient<Answer>(patientId);

  const fail = (error: unknown, toFormPath: SendRequest['toFormPath']): void => {
    setMayRetry(mayWorkAgain(error));
    if (isStale(error)) {
      setProblem(`Not saved. Someone changed this since you opened it. Your ${kept} are here.`);
      onStale?.();
      return;
    }
    const { words, issues } = saveProblem(error, toFormPath, kept);
    setProblem(words);
    for (const { path, message } of issues) form.setError(path as FieldPath<Form>, { type: 'server', message });
    if (issues[0]) goTo(issues[0].path);
  };

  const finish = (answer: Answer): void => {
    if (draftForm !== null) void draft.discard();
    work.release();
    onSaved(answer);
  };

  const goOn = (answer: Answer): void => {
    if (!another) return finish(answer);
    if (draftForm !== null) void draft.discard(true);
    form.reset(another.next(form.getValues()));
    another.onSaved(answer);
    goTo(another.firstField);
  };

  const send = (onDone: (answer: Answer) => void): void => {
    const [open] = state.openNow();
    if (open) return goTo(open.field);
    setProblem(null);
    setMayRetry(false);
    const { path, body, toFormPath } = request(form.getValues());
    save.mutate(
      { path, body },
      {
        onSuccess: onDone,
        onError: (error) => fail(error, toFormPath),
      },
    );
  };

  const refuse = (): void => {
    const [first] = check(form.getValues());
    if (first) goTo(first.path);
  };

  return {
    problem,
    mayRetry,
    draft,
    work,
    saving: save.isPending,
    submit: (event) => void form.handleSubmit(() => send(finish), refuse)(event),
    submitAndGoOn: () => void form.handleSubmit(() => send(goOn), refuse)(),
    keep: async () => {
      const keptAt = typedSomething ? await draft.keepNow() : restoredAt;
      const mayClose = !typedSomething || keptAt !== null;
      if (mayClose) work.release();
      return { mayClose, keptAt };
    },
  };
};
