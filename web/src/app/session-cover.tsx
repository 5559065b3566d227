import type { CurrentUser } from '@slighthill/shared/contracts/auth';
import { Dialog as Primitive } from 'radix-ui';
import { useRef, useState, type SyntheticEvent } from 'react';
import { ApiProblem, describeProblem } from '../lib/api-problem';
import { signIn, useSignOut } from '../lib/session';
import { waitWords } from '../lib/wait-words';
import { Button } from '../ui/button';
import { Field } from '../ui/field';
import { Mark } from '../ui/mark';
import { TextInput } from '../ui/text-input';

interface SessionCoverProps {
  user: CurrentUser;
  onWelcomeBack: (user: CurrentUser) => void;
  /** The cover is gone and the page can be reached again. */
  onLifted: () => void;
}

const explain = (error: unknown): string => {
  if (!(error instanceof ApiProblem)) return describeProblem(error);
  if (error.status === 401) return 'This password is not right. Try it again.';
  if (error.status === 429) return `Too many tries. ${waitWords(error.retryAfterS)} Your work is kept.`;
  return error.message;
};

/** Opaque, over everything: asks the same person's password. Nothing else of the page is left to read. */
export const SessionCover = ({ user, onWelcomeBack, onLifted }: SessionCoverProps) => {
  const password = useRef<HTMLInputElement>(null);
  const [saving, setSaving] = useState(false);
  const [error, setError] = useState<string>();
  const signOut = useSignOut();

  const submit = async (event: SyntheticEvent): Promise<void> => {
    event.preventDefault();
    const typed = password.current?.value ?? '';
    if (typed === '') {
      setError('Enter your password.');
      password.current?.focus();
      return;
    }
    setSaving(true);
    setError(undefined);
    try {
      onWelcomeBack(await signIn(user.email, typed));
    } catch (caught) {
      setSaving(false);
      setError(explain(caught));
      password.current?.focus();
      password.current?.select();
    }
  };

  return (
    <Primitive.Root open>
      <Primitive.Portal>
        <Primitive.Content
          onEscapeKeyDown={(event) => event.preventDefault()}
          onInteractOutside={(event) => event.preventDefault()}
          onOpenAutoFocus={(event) => {
            event.preventDefault();
            password.current?.focus();
          }}
          onCloseAutoFocus={(event) => {
            event.preventDefault();
            onLifted();
          }}
          data-session-cover
          className="fixed inset-0 z-100 flex flex-col items-center overflow-y-auto bg-paper px-5 pt-[14vh] pb-10 outline-none"
        >
          <div className="w-full max-w-96">
            <Mark width={64} />
            <Primitive.Title className="mt-6 text-title">Continue with your password</Primitive.Title>
            <Primitive.Description className="mt-2 text-ink-soft">
              The page is covered because it was quiet for a while or your sign-in ended. What you typed is kept.
            </Primitive.Description>
            <form onSubmit={(event) => void submit(event)} noValidate className="mt-6 flex flex-col gap-5">
              <input type="hidden" name="username" autoComplete="username" value={user.email} />
              <p className="font-semibold">{user.displayName}</p>
              <Field label="Password" error={error}>
                <TextInput ref={password} type="password" name="password" autoComplete="current-password" />
              </Field>
              <div className="flex flex-wrap items-center gap-3">
                <Button kind="main" type="submit" saving={saving} savingLabel="Checking">
                  Continue
                </Button>
                <Button kind="quiet" onClick={() => void signOut()}>
                  Sign in as someone else
                </Button>
              </div>
            </form>
          </div>
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
};
