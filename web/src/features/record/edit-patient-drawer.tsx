import { zodResolver } from '@hookform/resolvers/zod';
import { useId, useState } from 'react';
import { Controller, useForm } from 'react-hook-form';
import {
  diagnosisGroupLabels,
  diagnosisGroups,
  patientPatch,
  type Patient,
  type SexForPrediction,
} from '@slighthill/shared/contracts/patient';
import { applyProblem } from '../../lib/apply-problem';
import { choicesOf } from '../../lib/labels';
import { Button } from '../../ui/button';
import { DateInput } from '../../ui/date-input';
import { Drawer } from '../../ui/drawer';
import { Field } from '../../ui/field';
import { FormProblem } from '../../ui/form-problem';
import { RadioGroup } from '../../ui/radio-group';
import { Select } from '../../ui/select';
import { TextInput } from '../../ui/text-input';
import { useUnsavedWork } from '../../ui/use-unsaved-work';
import { useEditPatient } from './mutations';
import { staleWords } from './stale-words';

interface EditPatientDrawerProps {
  patient: Patient;
  onClose: () => void;
  onSaved: () => void;
}

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

const sexes: { value: SexForPrediction; label: string }[] = [
  { value: 'female', label: 'Female' },
  { value: 'male', label: 'Male' },
];

export const EditPatientDrawer = ({ patient, onClose, onSaved }: EditPatientDrawerProps) => {
  const formId = useId();
  const [problem, setProblem] = useState<string | null>(null);
  const edit = useEditPatient(patient.id);
  const { register, control, handleSubmit, setError, formState } = useForm({
    resolver: zodResolver(patientPatch),
    defaultValues: {
      version: patient.version,
      givenName: patient.givenName,
      familyName: patient.familyName,
      birthDate: patient.birthDate,
      sexForPrediction: patient.sexForPrediction,
      diagnosisGroup: patient.diagnosisGroup,
      recordNumber: patient.recordNumber,
      email: patient.email ?? '',
      phone: patient.phone ?? '',
    },
  });
  const { errors, isDirty } = formState;
  const work = useUnsavedWork(isDirty);

  const save = handleSubmit((body) => {
    setProblem(null);
    edit.mutate(body, {
      onSuccess: () => {
        work.release();
        onSaved();
      },
      onError: (error) => setProblem(staleWords(error) ?? applyProblem(error, setError, fields)),
    });
  });

  return (
    <Drawer
      title="Edit patient"
      subtitle={`${patient.givenName} ${patient.familyName}, ${patient.recordNumber}`}
      work={work}
      onClose={onClose}
      foot={
        <>
          <FormProblem>{problem}</FormProblem>
          <Button kind="main" type="submit" form={formId} saving={edit.isPending}>
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
        <Field label="Given name" error={errors.givenName?.message}>
          <TextInput {...register('givenName')} autoComplete="off" />
        </Field>
        <Field label="Family name" error={errors.familyName?.message}>
          <TextInput {...register('familyName')} autoComplete="off" />
        </Field>
        <Field
          label="Date of birth"
          error={errors.birthDate?.message}
          hint="Every predicted value is computed again from it"
        >
          <DateInput {...register('birthDate')} min="1900-01-01" />
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
              error={errors.sexForPrediction?.message}
            />
          )}
        />
        <Field label="Diagnosis group" error={errors.diagnosisGroup?.message}>
          <Select {...register('diagnosisGroup')} choices={choicesOf(diagnosisGroups, diagnosisGroupLabels)} />
        </Field>
        <Field label="Record number" error={errors.recordNumber?.message}>
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
