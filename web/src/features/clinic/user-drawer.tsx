import { zodResolver } from '@hookform/resolvers/zod';
import { userCreate, type StaffUser } from '@slighthill/shared/contracts/clinic';
import { staffRoles, type StaffRole } from '@slighthill/shared/permissions';
import { useId, useState } from 'react';
import { useForm } from 'react-hook-form';
import { applyProblem } from '../../lib/apply-problem';
import { Button } from '../../ui/button';
import { Checkbox } from '../../ui/checkbox';
import { Drawer } from '../../ui/drawer';
import { Field } from '../../ui/field';
import { FormProblem } from '../../ui/form-problem';
import { TextInput } from '../../ui/text-input';
import { useUnsavedWork } from '../../ui/use-unsaved-work';
import { useChangeUser, useCreateUser, type SavedUser } from './mutations';
import { roleHints, roleLabels } from './role-labels';

interface UserDrawerProps {
  user: StaffUser | null;
  onClose: () => void;
  onSaved: (saved: SavedUser) => void;
}

const fields = ['displayName', 'credential', 'email', 'roles'] as const;

export const UserDrawer = ({ user, onClose, onSaved }: UserDrawerProps) => {
  const formId = useId();
  const [id] = useState(() => crypto.randomUUID());
  const [disabled, setDisabled] = useState(user?.state === 'disabled');
  const [problem, setProblem] = useState<string | null>(null);
  const create = useCreateUser();
  const change = useChangeUser(user?.id ?? id);
  const { register, handleSubmit, setError, formState } = useForm({
    resolver: zodResolver(userCreate),
    defaultValues: {
      displayName: user?.displayName ?? '',
      credential: user?.credential ?? '',
      email: user?.email ?? '',
      roles: (user?.roles ?? []) as StaffRole[],
    },
  });
  const { errors } = formState;
  const work = useUnsavedWork(formState.isDirty || disabled !== (user?.state === 'disabled'));
  const onError = (error: unknown): void => setProblem(applyProblem(error, setError, fields));
  const done = (saved: SavedUser): void => {
    work.release();
    onSaved(saved);
  };

  const save = handleSubmit(({ displayName, credential, email, roles }) => {
    setProblem(null);
    if (!user) {
      create.mutate({ id, displayName, credential, email, roles }, { onSuccess: done, onError });
      return;
    }
    change.mutate(
      { version: user.version, displayName, credential, roles, disabled },
      { onSuccess: (saved) => done({ user: saved.user, invitation: null }), onError },
    );
  });

  return (
    <Drawer
      title={user ? user.displayName : 'New user'}
      subtitle={user ? user.email : 'Saving shows a link that lets this person choose a password'}
      work={work}
      onClose={onClose}
      foot={
        <>
          <FormProblem>{problem}</FormProblem>
          <Button kind="main" type="submit" form={formId} saving={create.isPending || change.isPending}>
            Save user
          </Button>
        </>
      }
    >
      <form id={formId} onSubmit={(event) => void save(event)} noValidate className="flex max-w-120 flex-col gap-5">
        <Field label="Name" error={errors.displayName?.message}>
          <TextInput {...register('displayName')} autoComplete="off" autoFocus />
        </Field>
        <Field
          label="Credential"
          labelNote="optional"
          hint="Stands after the name, such as MD or RRT"
          error={errors.credential?.message}
        >
          <TextInput {...register('credential')} autoComplete="off" />
        </Field>
        {!user && (
          <Field label="E-mail" hint="This person signs in with it" error={errors.email?.message}>
            <TextInput {...register('email')} type="email" autoComplete="off" />
          </Field>
        )}
        <fieldset>
          <legend className="text-note">Roles</legend>
          {staffRoles.map((role) => (
            <Checkbox key={role} {...register('roles')} value={role} label={roleLabels[role]} hint={roleHints[role]} />
          ))}
          {errors.roles && <p className="text-note text-rowan">{errors.roles.message}</p>}
        </fieldset>
        {user && (
          <Checkbox
            checked={disabled}
            onChange={(event) => setDisabled(event.target.checked)}
            label="May not sign in"
            hint="Ends this person's sign-ins at once; what they recorded stays"
          />
        )}
      </form>
    </Drawer>
  );
};
