import { zodResolver } from '@hookform/resolvers/zod';
import {
  diagnosisGroupLabels,
  diagnosisGroups,
  patientCreate,
  type SexForPrediction,
} from '@slighthill/shared/contracts/patient';
import { useId, useState } from 'react';
import { Controller, useForm, useWatch } from 'react-hook-form';
import { useLocation, useNavigate } from 'react-router-dom';
import { applyProblem } from '../../lib/apply-problem';
import { clinicDateOf } from '../../lib/clinic-time';
import { choicesOf } from '../../lib/labels';
import { usePageTitle } from '../../lib/page-title';
import { useClinicZone } from '../../lib/session';
import { sexWords } from '../../lib/sex-words';
import { Button } from '../../ui/button';
import { DateInput } from '../../ui/date-input';
import { Drawer } from '../../ui/drawer';
import { Field } from '../../ui/field';
import { FormProblem } from '../../ui/form-problem';
import { RadioGroup } from '../../ui/radio-group';
import { Select } from '../../ui/select';
import { TextInput } from '../../ui/text-input';
import { useUnsavedWork } from '../../ui/use-unsaved-work';
import { DuplicateQuestion } from './duplicate-question';
import { useCreatePatient } from './mutations';
import { useDuplicateCheck } from './use-duplicate-check';

const fields = [
  'givenName',
  'familyName',
  'birthDate',
  'sexForPrediction',
  'diagnosisGroup',
  'recordNumber',
  'email',
  'phone',
] as const;

const sexes = choicesOf<SexForPrediction>(['female', 'male'], sexWords);

export const Component = () => {
  usePageTitle('New patient');
  const formId = useId();
  const navigate = useNavigate();
  const { search } = useLocation();
  const timeZone = useClinicZone();
  const [id] = useState(() => crypto.randomUUID());
  const [problem, setProblem] = useState<string | null>(null);
  const create = useCreatePatient();
  const { register, control, handleSubmit, setError, setFocus, formState } = useForm({
    resolver: zodResolver(patientCreate),
    defaultValues: { id, givenName: '', familyName: '', birthDate: '', recordNumber: '', email: '', phone: '' },
  });
  const { errors, isDirty } = formState;
  const work = useUnsavedWork(isDirty);
  const [givenName, familyName, birthDate] = useWatch({ control, name: ['givenName', 'familyName', 'birthDate'] });
  const duplicates = useDuplicateCheck({ givenName, familyName, birthDate }, id);

  const save = handleSubmit(async (body) => {
    setProblem(null);
    if (!(await duplicates.mayGoOn())) return;
    create.mutate(body, {
      onSuccess: (patient) => {
        work.release();
        void navigate(`/patients/${patient.id}`);
      },
      onError: (error) => setProblem(applyProblem(error, setError, fields)),
    });
  });

  return (
    <Drawer
      title="New patient"
      subtitle="Goes to the patient's own record, where you enroll and record tests"
      work={work}
      onClose={() => void navigate({ pathname: '/patients', search })}
      foot={
        <>
          <FormProblem>{problem}</FormProblem>
          <Button kind="main" type="submit" form={formId} saving={create.isPending || duplicates.waiting}>
            Save patient
          </Button>
        </>
      }
    >
      <form
        id={formId}
        onSubmit={(event) => void save(event)}
        noValidate
        className="grid gap-x-4 gap-y-5 row:grid-cols-2"
      >
        <Field label="Given name" error={errors.givenName?.message}>
          <TextInput {...register('givenName')} autoComplete="off" autoFocus />
        </Field>
        <Field label="Family name" error={errors.familyName?.message}>
          <TextInput {...register('familyName')} autoComplete="off" />
        </Field>
        <Field
          label="Date of birth"
          error={errors.birthDate && (birthDate === '' ? 'Enter the date of birth' : errors.birthDate.message)}
          hint="The clinic's patients are 18 or older"
        >
          <DateInput {...register('birthDate')} min="1900-01-01" max={clinicDateOf(new Date(), timeZone)} />
        </Field>
        <Controller
          control={control}
          name="sexForPrediction"
          render={({ field }) => (
            <RadioGroup
              legend="Sex used in prediction equations"
              choices={sexes}
              value={field.value ?? null}
              onValueChange={field.onChange}
              inputRef={field.ref}
              error={errors.sexForPrediction?.message}
            />
          )}
        />
        {duplicates.question && (
          <DuplicateQuestion
            known={duplicates.question}
            others={duplicates.others}
            place={duplicates.place}
            onSomeoneElse={() => {
              duplicates.someoneElse();
              setFocus('diagnosisGroup');
            }}
          />
        )}
        <Controller
          control={control}
          name="diagnosisGroup"
          render={({ field }) => (
            <Field label="Diagnosis group" error={errors.diagnosisGroup?.message}>
              <Select
                ref={field.ref}
                value={field.value ?? ''}
                onChange={field.onChange}
                onBlur={field.onBlur}
                emptyLabel="Choose one"
                choices={choicesOf(diagnosisGroups, diagnosisGroupLabels)}
              />
            </Field>
          )}
        />
        <Field
          label="Record number"
          labelNote="optional"
          error={errors.recordNumber?.message}
          hint="Left empty, the next number is given"
        >
          <TextInput {...register('recordNumber')} autoComplete="off" />
        </Field>
        <Field label="E-mail" labelNote="optional" error={errors.email?.message}>
          <TextInput {...register('email')} type="email" autoComplete="off" />
        </Field>
        <Field label="Phone" labelNote="optional" error={errors.phone?.message}>
          <TextInput {...register('phone')} type="tel" autoComplete="off" />
        </Field>
      </form>
    </Drawer>
  );
};
