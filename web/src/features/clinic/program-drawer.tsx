import { zodResolver } from '@hookform/resolvers/zod';
import { programCreate, sessionKinds, type Program, type SessionKind } from '@slighthill/shared/contracts/clinic';
import { useId, useState } from 'react';
import { Controller, useForm } from 'react-hook-form';
import { applyProblem } from '../../lib/apply-problem';
import { Button } from '../../ui/button';
import { Checkbox } from '../../ui/checkbox';
import { Drawer } from '../../ui/drawer';
import { Field } from '../../ui/field';
import { FormProblem } from '../../ui/form-problem';
import { NumberInput } from '../../ui/number-input';
import { TextInput } from '../../ui/text-input';
import { useUnsavedWork } from '../../ui/use-unsaved-work';
import { useChangeProgram, useCreateProgram } from './mutations';
import { kindLabels } from './program-words';

interface ProgramDrawerProps {
  program: Program | null;
  onClose: () => void;
}

const numbers = [
  { name: 'plannedSessions', label: 'Sessions planned', unit: 'sessions' },
  { name: 'weeks', label: 'Over', unit: 'weeks' },
  { name: 'sessionsPerWeek', label: 'Most in one week', unit: 'sessions' },
  { name: 'sessionsPerDay', label: 'Most in one day', unit: 'sessions' },
] as const;

const fields = ['name', 'plannedSessions', 'weeks', 'sessionsPerWeek', 'sessionsPerDay', 'sessionKinds'] as const;

const startValues = (program: Program | null) => ({
  name: program?.name ?? '',
  plannedSessions: program?.plannedSessions ?? 24,
  weeks: program?.weeks ?? 12,
  sessionsPerWeek: program?.sessionsPerWeek ?? 2,
  sessionsPerDay: program?.sessionsPerDay ?? 1,
  sessionKinds: (program?.sessionKinds ?? ['exercise', 'education', 'assessment']) as SessionKind[],
});

export const ProgramDrawer = ({ program, onClose }: ProgramDrawerProps) => {
  const formId = useId();
  const [id] = useState(() => crypto.randomUUID());
  const [retired, setRetired] = useState(program?.retired ?? false);
  const [problem, setProblem] = useState<string | null>(null);
  const create = useCreateProgram();
  const change = useChangeProgram(program?.id ?? id);
  const { register, control, handleSubmit, setError, formState } = useForm({
    resolver: zodResolver(programCreate),
    defaultValues: startValues(program),
  });
  const { errors } = formState;
  const work = useUnsavedWork(formState.isDirty || retired !== (program?.retired ?? false));
  const outcome = {
    onSuccess: () => {
      work.release();
      onClose();
    },
    onError: (error: unknown) => setProblem(applyProblem(error, setError, fields)),
  };

  const save = handleSubmit((values) => {
    setProblem(null);
    if (program) change.mutate({ ...values, version: program.version, retired }, outcome);
    else create.mutate({ ...values, id }, outcome);
  });

  return (
    <Drawer
      title={program ? program.name : 'New program'}
      subtitle="A change counts for later enrollments; courses in progress keep what they began with"
      work={work}
      onClose={onClose}
      foot={
        <>
          <FormProblem>{problem}</FormProblem>
          <Button kind="main" type="submit" form={formId} saving={create.isPending || change.isPending}>
            Save program
          </Button>
        </>
      }
    >
      <form id={formId} onSubmit={(event) => void save(event)} noValidate className="flex max-w-140 flex-col gap-5">
        <Field label="Name" error={errors.name?.message}>
          <TextInput {...register('name')} autoComplete="off" autoFocus />
        </Field>
        <div className="grid gap-4 row:grid-cols-2">
          {numbers.map(({ name, label, unit }) => (
            <Controller
              key={name}
              control={control}
              name={name}
              render={({ field: { value, onChange, onBlur, ref } }) => (
                <Field label={label} error={errors[name]?.message}>
                  <NumberInput ref={ref} unit={unit} value={value} onValueChange={onChange} onBlur={onBlur} />
                </Field>
              )}
            />
          ))}
        </div>
        <fieldset>
          <legend className="text-note">Session kinds</legend>
          {sessionKinds.map((kind) => (
            <Checkbox key={kind} {...register('sessionKinds')} value={kind} label={kindLabels[kind]} />
          ))}
          {errors.sessionKinds && <p className="text-note text-rowan">{errors.sessionKinds.message}</p>}
        </fieldset>
        {program && (
          <Checkbox
            checked={retired}
            onChange={(event) => setRetired(event.target.checked)}
            label="Retired"
            hint="No new patients; courses in progress go on"
          />
        )}
      </form>
    </Drawer>
  );
};
