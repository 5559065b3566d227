import { holdReleaseBody, type FileEntry } from '@slighthill/shared/contracts/file-entry';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Button } from '../../../ui/button';
import { Dialog } from '../../../ui/dialog';
import { Field } from '../../../ui/field';
import { TextArea } from '../../../ui/text-area';
import { issuesOf, resolverFor } from '../forms/form-issues';
import { isStale, saveProblem } from '../forms/save-problem';
import { useSaveAboutPatient } from '../mutations';
import { fileEntryWords } from './file-words';

interface ReleaseDialogProps {
  entry: FileEntry;
  onClose: () => void;
  onReleased: () => void;
  onStale: () => void;
}

const resolver = resolverFor<{ reason: string }>(({ reason }) =>
  issuesOf(
    holdReleaseBody.safeParse({ version: 1, reason }),
    (path) => path.map(String).join('.'),
    () => false,
  ),
);

/** A hold is released by a pulmonologist with a reason; both stay readable. */
export const ReleaseDialog = ({ entry, onClose, onReleased, onStale }: ReleaseDialogProps) => {
  const [problem, setProblem] = useState<string | null>(null);
  const { register, handleSubmit, formState } = useForm({ defaultValues: { reason: '' }, resolver });
  const save = useSaveAboutPatient<unknown>(entry.patientId);
  const submit = handleSubmit(({ reason }) => {
    setProblem(null);
    save.mutate(
      { path: `/api/file-entries/${entry.id}/release`, body: { version: entry.version, reason: reason.trim() } },
      {
        onSuccess: onReleased,
        onError: (error) => {
          if (isStale(error)) onStale();
          setProblem(
            isStale(error)
              ? 'Not released. Someone changed this since you opened it; the page behind shows the newest. Release it again if that is still right.'
              : saveProblem(error, () => null, 'words').words.replace('Not saved.', 'Not released.'),
          );
        },
      },
    );
  });
  return (
    <Dialog
      title="Release this hold?"
      description={`${fileEntryWords(entry)}. After the release the patient may test and train again, as local protocol allows.`}
      open
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Keep the hold</Button>
          <Button kind="main" type="submit" form="release-form" saving={save.isPending} savingLabel="Releasing">
            Release it
          </Button>
        </>
      }
    >
      <form id="release-form" noValidate onSubmit={(event) => void submit(event)} className="mt-4 flex flex-col gap-3">
        <Field label="Why it is released" error={formState.errors.reason?.message}>
          <TextArea {...register('reason')} rows={3} />
        </Field>
        <p role="alert" className="text-note font-semibold text-rowan">
          {problem}
        </p>
      </form>
    </Dialog>
  );
};
