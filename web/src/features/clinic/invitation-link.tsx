import { useState } from 'react';
import { formatInstant } from '../../lib/clinic-time';
import { useClinicZone } from '../../lib/session';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { SavedNote } from '../../ui/saved-note';
import { TextInput } from '../../ui/text-input';
import type { IssuedInvitation } from './mutations';

interface InvitationLinkProps {
  name: string;
  invitation: IssuedInvitation;
  onDone: () => void;
}

/** Shown once: the server keeps only a hash of the link's token. */
export const InvitationLink = ({ name, invitation, onDone }: InvitationLinkProps) => {
  const timeZone = useClinicZone();
  const [copied, setCopied] = useState<string | null>(null);
  const link = new URL(invitation.path, window.location.origin).href;

  const copy = async (): Promise<void> => {
    try {
      await navigator.clipboard.writeText(link);
      setCopied('Copied.');
    } catch {
      setCopied('Could not copy. Select the link and copy it by hand.');
    }
  };

  return (
    <section aria-label="Invitation link" className="mt-4 rounded-control bg-mist p-4">
      <div className="flex flex-wrap items-end gap-3">
        <Field
          label={`Invitation link for ${name}`}
          hint={`Send it to ${name} yourself. It is shown only now and works once, until ${formatInstant(invitation.expiresAt, timeZone)}.`}
          className="min-w-0 flex-1 basis-90"
        >
          <TextInput
            readOnly
            autoFocus
            value={link}
            onFocus={(event) => event.target.select()}
            className="bg-surface"
          />
        </Field>
        <div className="flex gap-2 pb-5.5">
          <Button icon="copy" onClick={() => void copy()}>
            Copy link
          </Button>
          <Button kind="quiet" onClick={onDone}>
            Done
          </Button>
        </div>
      </div>
      <SavedNote>{copied}</SavedNote>
    </section>
  );
};
