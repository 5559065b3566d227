import { useState } from 'react';
import { useFormContext } from 'react-hook-form';
import { Field } from '../../../ui/field';
import { TextInput } from '../../../ui/text-input';
import { ChangeList } from '../history/change-list';
import { changedFacts, type Fact, type FactChange } from '../history/fact';
import type { FormIssue } from './form-issues';

/** An amendment says why. */
export const amendIssues = ({ amendReason }: { amendReason: string }): readonly FormIssue[] =>
  amendReason.trim() === '' ? [{ path: 'amendReason', message: 'Say why in a few words' }] : [];

export interface AmendVersion {
  /** The version the amendment is made on: the one opened, or after a conflict the newest shown. */
  version: number;
  newer: FactChange[] | null;
  takeNewest: () => void;
}

interface Content {
  version: number;
  facts: Fact[];
}

/**
 * Holds on to the version that was opened, so that a change by someone else is never overwritten unseen. After a
 * conflict the newest is got and shown; only then may saving replace it.
 */
export const useAmendVersion = (opened: Content, newest: () => Promise<Content | null>): AmendVersion => {
  const [base, setBase] = useState(opened);
  const [newer, setNewer] = useState<FactChange[] | null>(null);
  const take = async (): Promise<void> => {
    const found = await newest();
    if (!found) return;
    setNewer(changedFacts(base.facts, found.facts));
    setBase(found);
  };
  return { version: base.version, newer, takeNewest: () => void take() };
};

interface AmendHeadProps {
  amendment: AmendVersion;
}

/** Why the entry is amended, and what someone else changed meanwhile. */
export const AmendHead = ({ amendment: { newer } }: AmendHeadProps) => {
  const { register, formState } = useFormContext<{ amendReason: string }>();
  return (
    <>
      {newer && (
        <div role="status" className="rounded-control bg-gorse-wash px-4 py-3 text-gorse-ink">
          <p className="font-semibold">Someone changed this since you opened it. Newest in the record:</p>
          {newer.length > 0 ? <ChangeList changes={newer} /> : <p className="text-note">Only its note of changes.</p>}
          <p className="mt-1 text-note">What you typed is below. Saving again replaces the newest.</p>
        </div>
      )}
      <Field
        label="Why it is amended"
        hint="Kept in the history beside the earlier values"
        error={formState.errors.amendReason?.message}
      >
        <TextInput {...register('amendReason')} autoComplete="off" />
      </Field>
    </>
  );
};
