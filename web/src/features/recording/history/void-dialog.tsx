import { voidBody, voidReasons, type VoidBody } from '@slighthill/shared/contracts/common';
import { useState } from 'react';
import { Controller, useForm } from 'react-hook-form';
import { choicesOf } from '../../../lib/labels';
import { Button } from '../../../ui/button';
import { Dialog } from '../../../ui/dialog';
import { Field } from '../../../ui/field';
import { RadioGroup } from '../../../ui/radio-group';
import { TextArea } from '../../../ui/text-area';
import { issuesOf, resolverFor } from '../forms/form-issues';
import { isStale, saveProblem } from '../forms/save-problem';
import { useSaveAboutPatient } from '../mutations';
import { voidReasonLabels } from './void-words';

interface VoidDialogProps {
  /** "this spirometry test". */
  what: string;
  patientId: string;
  path: string;
  version: number;
  onClose: () => void;
  /** Someone changed it meanwhile: get the newest. */
  onStale: () => void;
}

interface VoidForm {
  reason: VoidBody['reason'] | '';
  text: string;
}

const resolver = resolverFor<VoidForm>(({ reason, text }) =>
  issuesOf(
    voidBody.safeParse({ version: 1, reason: reason === '' ? undefined : reason, text }),
    (path) => path.map(String).join('.'),
    () => false,
  ),
);

/** For what should never have been entered here. It leaves trends and summaries at once and stays readable. */
export const VoidDialog = ({ what, patientId, path, version, onClose, onStale }: VoidDialogProps) => {
  const [problem, setProblem] = useState<string | null>(null);
  const { control, register, handleSubmit, formState } = useForm<VoidForm>({
    defaultValues: { reason: '', text: '' },
    resolver,
    shouldFocusError: true,
  });
  const save = useSaveAboutPatient<unknown>(patientId);

  const submit = handleSubmit(({ reason, text }) => {
    setProblem(null);
    save.mutate(
      { path, body: { version, reason, text } },
      {
        onSuccess: onClose,
        onError: (error) => {
          if (isStale(error)) onStale();
          setProblem(
            isStale(error)
              ? 'Not voided. Someone changed this since you opened it; the page behind shows the newest. Void it again if it is still wrong.'
              : saveProblem(error, () => null, 'words').words.replace('Not saved.', 'Not voided.'),
          );
        },
      },
    );
  });

  return (
    <Dialog
      title={`Void ${what}?`}
      description="It leaves trends, pattern, flags and summaries at once. It stays readable with who, when and why."
      open
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Keep it</Button>
          <Button kind="danger" type="submit" form="void-form" saving={save.isPending} savingLabel="Voiding">
            Void it
          </Button>
        </>
      }
    >
      <form id="void-form" noValidate onSubmit={(event) => void submit(event)} className="mt-4 flex flex-col gap-4">
        <Controller
          control={control}
          name="reason"
          render={({ field }) => (
            <RadioGroup
              name={field.name}
              legend="Why"
              arrange="list"
              choices={choicesOf(voidReasons, voidReasonLabels)}
              value={field.value === '' ? null : field.value}
              onValueChange={field.onChange}
              error={formState.errors.reason?.message}
            />
          )}
        />
        <Field label="In words" labelNote="needed for Other" error={formState.errors.text?.message}>
          <TextArea {...register('text')} rows={2} />
        </Field>
        <p role="alert" className="text-note font-semibold text-rowan">
          {problem}
        </p>
      </form>
    </Dialog>
  );
};
