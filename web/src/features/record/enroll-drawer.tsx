import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { useId, useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { enrollmentCreate, type Patient } from '@slighthill/shared/contracts/patient';
import { describeProblem } from '../../lib/api-problem';
import { applyProblem } from '../../lib/apply-problem';
import { clinicDateOf } from '../../lib/clinic-time';
import { useClinicZone } from '../../lib/session';
import { Button } from '../../ui/button';
import { DateInput } from '../../ui/date-input';
import { Drawer } from '../../ui/drawer';
import { ErrorNotice } from '../../ui/error-notice';
import { Field } from '../../ui/field';
import { FormProblem } from '../../ui/form-problem';
import { Select } from '../../ui/select';
import { useUnsavedWork } from '../../ui/use-unsaved-work';
import { useEnroll } from './mutations';
import { programChoicesQuery } from './queries';

interface EnrollDrawerProps {
  patient: Patient;
  onClose: () => void;
  onSaved: (programName: string) => void;
}

const fields = ['programId', 'startOn', 'consentOn'] as const;
const emptyToNull = { setValueAs: (value: string | null) => value || null };

export const EnrollDrawer = ({ patient, onClose, onSaved }: EnrollDrawerProps) => {
  const formId = useId();
  const today = clinicDateOf(new Date(), useClinicZone());
  const [id] = useState(() => crypto.randomUUID());
  const [problem, setProblem] = useState<string | null>(null);
  const programs = useQuery(programChoicesQuery);
  const enroll = useEnroll(patient.id);
  const { register, control, handleSubmit, setError, formState } = useForm({
    resolver: zodResolver(enrollmentCreate),
    defaultValues: { id, programId: '', startOn: today, consentOn: null },
  });
  const { errors, isDirty } = formState;
  const work = useUnsavedWork(isDirty);
  const programId = useWatch({ control, name: 'programId' });
  const program = programs.data?.find((candidate) => candidate.id === programId);

  const save = handleSubmit((body) => {
    setProblem(null);
    enroll.mutate(body, {
      onSuccess: ({ enrollment }) => {
        work.release();
        onSaved(enrollment.programName);
      },
      onError: (error) => setProblem(applyProblem(error, setError, fields)),
    });
  });

  return (
    <Drawer
      title="Enroll in a program"
      subtitle={`${patient.givenName} ${patient.familyName}, ${patient.recordNumber}`}
      work={work}
      onClose={onClose}
      foot={
        <>
          <FormProblem>{problem}</FormProblem>
          <Button kind="main" type="submit" form={formId} saving={enroll.isPending}>
            Enroll
          </Button>
        </>
      }
    >
      {programs.error && (
        <ErrorNotice className="mb-5" onRetry={() => void programs.refetch()} retrying={programs.isFetching}>
          The programs could not be loaded. {describeProblem(programs.error)}
        </ErrorNotice>
      )}
      <form
        id={formId}
        noValidate
        onSubmit={(event) => void save(event)}
        className="grid gap-x-4 gap-y-5 row:grid-cols-2"
      >
        <Field
          label="Program"
          className="row:col-span-2"
          error={errors.programId && (programId === '' ? 'Choose a program' : errors.programId.message)}
          hint={
            program
              ? `${program.plannedSessions} sessions in ${program.weeks} weeks, ${program.sessionsPerWeek} a week`
              : programs.data?.length === 0
                ? 'Your clinic has no program yet. The administrator adds one under Clinic.'
                : undefined
          }
        >
          <Select
            {...register('programId')}
            emptyLabel={programs.data ? 'Choose one' : 'Loading'}
            choices={(programs.data ?? []).map(({ id: value, name }) => ({ value, label: name }))}
          />
        </Field>
        <Field
          label="Start date"
          error={errors.startOn?.message}
          hint="Until the first exercise session this is the day tests are compared with"
        >
          <DateInput {...register('startOn')} />
        </Field>
        <Field
          label="Consent given on"
          labelNote="optional"
          error={errors.consentOn?.message}
          hint="Leave empty until the patient has agreed"
        >
          <DateInput {...register('consentOn', emptyToNull)} max={today} />
        </Field>
      </form>
    </Drawer>
  );
};
