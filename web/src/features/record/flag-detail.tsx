import { useId, useState } from 'react';
import type { Flag } from '@slighthill/shared/contracts/patient';
import { describeProblem } from '../../lib/api-problem';
import { formatInstant } from '../../lib/clinic-time';
import { useClinicZone } from '../../lib/session';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { TextArea } from '../../ui/text-area';
import { useResolveFlag } from './mutations';

interface FlagDetailProps {
  flag: Flag;
  patientId: string;
  canResolve: boolean;
  onResolved: () => void;
}

/** What the flag says and since when; whoever may resolve it writes down what was done. */
export const FlagDetail = ({ flag, patientId, canResolve, onResolved }: FlagDetailProps) => {
  const zone = useClinicZone();
  const formId = useId();
  const [note, setNote] = useState('');
  const [missing, setMissing] = useState(false);
  const resolve = useResolveFlag(patientId, flag.id);
  const save = (): void => {
    setMissing(note.trim() === '');
    if (note.trim() === '') return;
    // The renewed record may take this card away before the answer is here, so its caller waits for the answer itself.
    resolve.mutateAsync({ version: flag.version, note: note.trim() }).then(onResolved, () => undefined);
  };
  return (
    <section aria-label={flag.label}>
      <p className="font-bold">{flag.label}</p>
      <p className="mt-1">{flag.detail}</p>
      <p className="mt-1 text-note text-ink-soft">Raised {formatInstant(flag.raisedAt, zone)}</p>
      {canResolve ? (
        <form
          id={formId}
          className="mt-3 flex flex-col items-start gap-3"
          onSubmit={(event) => {
            event.preventDefault();
            save();
          }}
        >
          <Field
            label="What was done"
            className="w-full"
            error={
              missing
                ? 'Write what was done before resolving it'
                : resolve.isError
                  ? `Not resolved. ${describeProblem(resolve.error)}`
                  : undefined
            }
          >
            <TextArea value={note} onChange={(event) => setNote(event.target.value)} maxLength={500} rows={2} />
          </Field>
          <Button kind="main" size="row" type="submit" saving={resolve.isPending}>
            Resolve flag
          </Button>
        </form>
      ) : (
        <p className="mt-2 text-note text-ink-soft">It stays open until its owner resolves it with a note.</p>
      )}
    </section>
  );
};
