import { useQueryClient } from '@tanstack/react-query';
import { useRef, useState, type SyntheticEvent } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { ApiProblem, describeProblem } from '../../lib/api-problem';
import { usePageTitle } from '../../lib/page-title';
import { meQuery, signIn } from '../../lib/session';
import { waitWords } from '../../lib/wait-words';
import { Button } from '../../ui/button';
import { ErrorNotice } from '../../ui/error-notice';
import { Field } from '../../ui/field';
import { PlainPage } from '../../ui/plain-page';
import { TextInput } from '../../ui/text-input';

interface FieldErrors {
  email?: string;
  password?: string;
}

const explain = (error: unknown): string => {
  if (!(error instanceof ApiProblem)) return describeProblem(error);
  if (error.status === 401) return 'E-mail or password is not right. Check both and try again.';
  if (error.status === 429) return `Too many tries. ${waitWords(error.retryAfterS)}`;
  return error.message;
};

/** Only an address inside this app; anything else is not followed. */
const safeNext = (next: string | null): string | null =>
  next !== null && /^\/(?![/\\])/.test(next) && !next.startsWith('/sign-in') ? next : null;

/** A plain form on purpose: this page is the first load, and two fields need no form library. */
export const Component = () => {
  usePageTitle('Sign in');
  const client = useQueryClient();
  const navigate = useNavigate();
  const [params] = useSearchParams();
  const email = useRef<HTMLInputElement>(null);
  const password = useRef<HTMLInputElement>(null);
  const [errors, setErrors] = useState<FieldErrors>({});
  const [problem, setProblem] = useState<string>();
  const [saving, setSaving] = useState(false);

  const check = (): boolean => {
    const found: FieldErrors = {};
    if (!email.current?.value.trim()) found.email = 'Enter your e-mail address.';
    if (!password.current?.value) found.password = 'Enter your password.';
    setErrors(found);
    if (found.email) email.current?.focus();
    else if (found.password) password.current?.focus();
    return !found.email && !found.password;
  };

  const submit = async (event: SyntheticEvent): Promise<void> => {
    event.preventDefault();
    setProblem(undefined);
    if (!check()) return;
    setSaving(true);
    try {
      const user = await signIn(email.current?.value.trim() ?? '', password.current?.value ?? '');
      client.clear();
      client.setQueryData(meQuery.queryKey, user);
      await navigate(safeNext(params.get('next')) ?? user.firstPath, { replace: true });
    } catch (error) {
      setSaving(false);
      setProblem(explain(error));
      password.current?.focus();
      password.current?.select();
    }
  };

  return (
    <PlainPage>
      <div className="mx-auto w-full max-w-96">
        <h1 className="text-title">Sign in</h1>
        <form onSubmit={(event) => void submit(event)} noValidate className="mt-6 flex flex-col gap-5">
          {problem && <ErrorNotice>{problem}</ErrorNotice>}
          <Field label="E-mail" error={errors.email}>
            <TextInput
              ref={email}
              type="email"
              name="email"
              autoComplete="username"
              autoCapitalize="none"
              spellCheck={false}
            />
          </Field>
          <Field label="Password" error={errors.password}>
            <TextInput ref={password} type="password" name="password" autoComplete="current-password" />
          </Field>
          <Button kind="main" type="submit" saving={saving} savingLabel="Signing in" className="self-start">
            Sign in
          </Button>
        </form>
        <p className="mt-8 border-t border-line pt-4 text-note text-ink-soft">
          No account or no password? Ask your clinic for an invitation.
        </p>
      </div>
    </PlainPage>
  );
};
