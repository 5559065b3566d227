import { useQueryClient } from '@tanstack/react-query';
import type { Invitation } from '@slighthill/shared/contracts/auth';
import { useRef, useState, type SyntheticEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { translate } from '../../i18n/translate';
import { ApiProblem, describeProblem } from '../../lib/api-problem';
import { meQuery } from '../../lib/session';
import { announceSession } from '../../lib/session-channel';
import { waitWords } from '../../lib/wait-words';
import { Button } from '../../ui/button';
import { ErrorNotice } from '../../ui/error-notice';
import { Field } from '../../ui/field';
import { TextInput } from '../../ui/text-input';
import { acceptInvitation } from './queries';

interface ChoosePasswordProps {
  token: string;
  invitation: Invitation;
}

interface FieldErrors {
  password?: string;
  again?: string;
}

const checkPasswords = (password: string, again: string): FieldErrors => {
  if (password.length < 12) return { password: translate('welcome.password.short', { count: password.length }) };
  if (password.length > 200) return { password: translate('welcome.password.long') };
  if (password !== again) return { again: translate('welcome.again.differs') };
  return {};
};

const explain = (error: unknown): string => {
  if (!(error instanceof ApiProblem)) return describeProblem(error);
  if (error.status === 404 || error.status === 409) return translate('welcome.used');
  if (error.status === 429) return waitWords(error.retryAfterS);
  return error.fields[0]?.message ?? error.message;
};

export const ChoosePassword = ({ token, invitation }: ChoosePasswordProps) => {
  const client = useQueryClient();
  const navigate = useNavigate();
  const password = useRef<HTMLInputElement>(null);
  const again = useRef<HTMLInputElement>(null);
  const [errors, setErrors] = useState<FieldErrors>({});
  const [problem, setProblem] = useState<string>();
  const [saving, setSaving] = useState(false);

  const submit = async (event: SyntheticEvent): Promise<void> => {
    event.preventDefault();
    const chosen = password.current?.value ?? '';
    const found = checkPasswords(chosen, again.current?.value ?? '');
    setErrors(found);
    setProblem(undefined);
    if (found.password) password.current?.focus();
    else if (found.again) again.current?.focus();
    if (found.password || found.again) return;
    setSaving(true);
    try {
      const user = await acceptInvitation(token, chosen);
      announceSession({ kind: 'signed-in', userId: user.id });
      client.clear();
      client.setQueryData(meQuery.queryKey, user);
      await navigate(user.firstPath, { replace: true });
    } catch (error) {
      setSaving(false);
      setProblem(explain(error));
    }
  };

  return (
    <>
      <h1 className="text-p-title">{translate('welcome.title', { name: invitation.displayName })}</h1>
      <p className="mt-2">{translate('welcome.lead', { clinic: invitation.clinicName, email: invitation.email })}</p>
      <form onSubmit={(event) => void submit(event)} noValidate className="mt-6 flex flex-col gap-5">
        {problem && <ErrorNotice size="patient">{problem}</ErrorNotice>}
        <input type="hidden" name="username" autoComplete="username" value={invitation.email} />
        <Field
          size="patient"
          label={translate('welcome.password')}
          hint={translate('welcome.password.hint')}
          error={errors.password}
        >
          <TextInput ref={password} size="patient" type="password" autoComplete="new-password" />
        </Field>
        <Field size="patient" label={translate('welcome.again')} error={errors.again}>
          <TextInput ref={again} size="patient" type="password" autoComplete="new-password" />
        </Field>
        <Button kind="main" size="patient" type="submit" saving={saving} savingLabel={translate('welcome.saving')}>
          {translate('welcome.save')}
        </Button>
      </form>
    </>
  );
};
