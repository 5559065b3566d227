import { zodResolver } from '@hookform/resolvers/zod';
import { useId, useState } from 'react';
import { Controller, useForm, useWatch } from 'react-hook-form';
import {
  enrollmentPatch,
  type Enrollment,
  type EnrollmentStatus,
  type Patient,
} from '@slighthill/shared/contracts/patient';
import { applyProblem } from '../../lib/apply-problem';
import { clinicDateOf } from '../../lib/clinic-time';
import { useClinicZone } from '../../lib/session';
import { Button } from '../../ui/button';
import { DateInput } from '../../ui/date-input';
import { Drawer } from '../../ui/drawer';
import { Field } from '../../ui/field';
import { FormProblem } from '../../ui/form-problem';
import { RadioGroup } from '../../ui/radio-group';
import { TextArea } from '../../ui/text-area';
import { useUnsavedWork } from '../../ui/use-unsaved-work';
import { useChangeEnrollment } from './mutations';
import { enrollmentStatusLabels } from './record-words';
import { staleWords } from './stale-words';

interface ChangeEnrollmentDrawerProps {
  patient: Patient;
  enrollment: Enrollment;
  onClose: () => void;
  onSaved: () => void;
}

const fields = ['startOn', 'consentOn', 'status', 'endedOn', 'reason'] as const;

/** What may follow what; the API has the last word. */
const following: Record<EnrollmentStatus, readonly EnrollmentStatus[]> = {
  planned: ['planned', 'active', 'withdrawn'],
  active: ['active', 'paused', 'completed', 'partly-completed', 'withdrawn'],
  paused: ['paused', 'active', 'completed', 'partly-completed', 'withdrawn'],
  completed: ['completed'],
  'partly-completed': ['partly-completed'],
  withdrawn: ['withdrawn'],
};
const endings: readonly EnrollmentStatus[] = ['completed', 'partly-completed', 'withdrawn'];
const needReason: readonly EnrollmentStatus[] = ['paused', 'partly-completed', 'withdrawn'];

export const ChangeEnrollmentDrawer = ({ patient, enrollment, onClose, onSaved }: ChangeEnrollmentDrawerProps) => {
  const formId = useId();
  const today = clinicDateOf(new Date(), useClinicZone());
  const [problem, setProblem] = useState<string | null>(null);
  const change = useChangeEnrollment(patient.id, enrollment.id);
  const { register, control, handleSubmit, setError, formState } = useForm({
    resolver: zodResolver(enrollmentPatch),
    defaultValues: {
      version: enrollment.version,
      startOn: enrollment.startOn,
      consentOn: enrollment.consentOn,
      status: enrollment.status,
      endedOn: undefined as string | undefined,
      reason: '',
    },
  });
  const { errors, isDirty } = formState;
  const work = useUnsavedWork(isDirty);
  const status = useWatch({ control, name: 'status' }) ?? enrollment.status;
  const changesStatus = status !== enrollment.status;
  const ends = changesStatus && endings.includes(status);

  const save = handleSubmit((body) => {
    setProblem(null);
    if (changesStatus && needReason.includes(status) && !body.reason) {
      setError('reason', { message: 'Say why in a few words' }, { shouldFocus: true });
      return;
    }
    const { endedOn, ...rest } = body;
    change.mutate(ends && endedOn ? { ...rest, endedOn } : rest, {
      onSuccess: () => {
        work.release();
        onSaved();
      },
      onError: (error) => setProblem(staleWords(error) ?? applyProblem(error, setError, fields)),
    });
  });

  return (
    <Drawer
      title="Change enrollment"
      subtitle={`${patient.givenName} ${patient.familyName}, ${enrollment.programName}`}
      work={work}
      onClose={onClose}
      foot={
        <>
          <FormProblem>{problem}</FormProblem>
          <Button kind="main" type="submit" form={formId} saving={change.isPending}>
            Save changes
          </Button>
        </>
      }
    >
      <form
        id={formId}
        noValidate
        onSubmit={(event) => void save(event)}
        className="grid gap-x-4 gap-y-5 row:grid-cols-2"
      >
        <Field label="Start date" error={errors.startOn?.message} hint="The planned end moves with it">
          <DateInput {...register('startOn')} />
        </Field>
        <Field label="Consent given on" labelNote="optional" error={errors.consentOn?.message}>
          <DateInput {...register('consentOn', { setValueAs: (value: string | null) => value || null })} max={today} />
        </Field>
        <div className="row:col-span-2">
          <Controller
            control={control}
            name="status"
            render={({ field }) => (
              <RadioGroup
                legend="State"
                choices={following[enrollment.status].map((value) => ({ value, label: enrollmentStatusLabels[value] }))}
                value={field.value ?? null}
                onValueChange={field.onChange}
                error={errors.status?.message}
                hint={ends ? 'An ended enrollment stays ended. A new course is a new enrollment.' : undefined}
              />
            )}
          />
        </div>
        {ends && (
          <Field label="Ended on" labelNote="today if left empty" error={errors.endedOn?.message}>
            <DateInput {...register('endedOn', { setValueAs: (value: string) => value || undefined })} max={today} />
          </Field>
        )}
        {changesStatus && (
          <Field
            label="Reason"
            {...(needReason.includes(status) ? {} : { labelNote: 'optional' })}
            className="row:col-span-2"
            error={errors.reason?.message}
          >
            <TextArea {...register('reason')} maxLength={500} />
          </Field>
        )}
      </form>
    </Drawer>
  );
};
