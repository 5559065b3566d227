import { diagnosisGroupLabels, diagnosisGroups, type Patient } from '@slighthill/shared/contracts/patient';
import {
  medicineClasses,
  oxygenDevices,
  smokingStatuses,
  type FileEntryKind,
} from '@slighthill/shared/contracts/file-entry';
import type { ReactNode } from 'react';
import { useFormContext } from 'react-hook-form';
import { choicesOf } from '../../../lib/labels';
import { Checkbox } from '../../../ui/checkbox';
import { DateInput, DateTimeInput } from '../../../ui/date-input';
import { Field } from '../../../ui/field';
import { Select } from '../../../ui/select';
import { TextInput } from '../../../ui/text-input';
import type { FileForm } from './file-form';
import { medicineClassLabels, oxygenDeviceLabels, smokingLabels } from './file-words';
import { HoldField } from './hold-field';
import { YesNoField } from './yes-no-field';

interface KindFieldsProps {
  kind: FileEntryKind;
  patient: Pick<Patient, 'abilities'>;
  status: FileForm['status'];
}

const useErrors = () => {
  const { register, formState } = useFormContext<FileForm>();
  const error = (name: keyof FileForm): string | undefined => {
    const found = formState.errors[name];
    return found && 'message' in found && typeof found.message === 'string' ? found.message : undefined;
  };
  return { register, error };
};

const DiagnosisFields = () => {
  const { register, error } = useErrors();
  return (
    <>
      <Field label="Diagnosis group" error={error('diagnosisGroup')}>
        <Select
          {...register('diagnosisGroup')}
          emptyLabel="Choose one"
          choices={choicesOf(diagnosisGroups, diagnosisGroupLabels)}
        />
      </Field>
      <Field
        label="Confirmed by"
        labelNote="optional"
        hint="The clinician who confirmed it"
        error={error('confirmedBy')}
      >
        <TextInput {...register('confirmedBy')} autoComplete="off" />
      </Field>
      <Field label="In words" labelNote="optional" error={error('description')} className="row:col-span-2">
        <TextInput {...register('description')} autoComplete="off" />
      </Field>
    </>
  );
};

const ExacerbationFields = () => {
  const { register } = useErrors();
  return (
    <div className="flex flex-wrap gap-x-8 row:col-span-2">
      <Checkbox {...register('steroid')} label="Treated with a steroid" />
      <Checkbox {...register('antibiotic')} label="Treated with an antibiotic" />
      <Checkbox {...register('admitted')} label="Admitted to a hospital" />
    </div>
  );
};

/** Only a pulmonologist orders; the others record what an order from elsewhere says, with its prescriber. */
const OxygenFields = ({ mayOrder }: { mayOrder: boolean }) => {
  const { register, error } = useErrors();
  return (
    <>
      <div className="grid grid-cols-3 gap-4 row:col-span-2">
        <Field label="At rest" error={error('restLpm')}>
          <TextInput {...register('restLpm')} unit="L/min" inputMode="decimal" autoComplete="off" />
        </Field>
        <Field label="Walking" error={error('walkingLpm')}>
          <TextInput {...register('walkingLpm')} unit="L/min" inputMode="decimal" autoComplete="off" />
        </Field>
        <Field label="Asleep" error={error('asleepLpm')}>
          <TextInput {...register('asleepLpm')} unit="L/min" inputMode="decimal" autoComplete="off" />
        </Field>
      </div>
      <Field label="Device" error={error('device')}>
        <Select
          {...register('device')}
          emptyLabel="Choose one"
          choices={choicesOf(oxygenDevices, oxygenDeviceLabels)}
        />
      </Field>
      <Field label="Prescriber" error={error('prescriber')}>
        <TextInput {...register('prescriber')} autoComplete="off" />
      </Field>
      <div className="row:col-span-2">
        {mayOrder ? (
          <Checkbox {...register('outside')} label="Written elsewhere and only recorded here" />
        ) : (
          <p className="rounded-control bg-mist px-4 py-3 text-note">
            This records what an outside order says. Only a pulmonologist orders oxygen here.
          </p>
        )}
      </div>
    </>
  );
};

const MedicineFields = () => {
  const { register, error } = useErrors();
  return (
    <>
      <Field label="Name" error={error('name')}>
        <TextInput {...register('name')} autoComplete="off" />
      </Field>
      <Field label="Kind" error={error('medicineClass')}>
        <Select
          {...register('medicineClass')}
          emptyLabel="Choose one"
          choices={choicesOf(medicineClasses, medicineClassLabels)}
        />
      </Field>
      <Field label="Last dose" labelNote="optional" error={error('lastDoseAt')}>
        <DateTimeInput {...register('lastDoseAt')} />
      </Field>
      <Field label="Stopped on" labelNote="optional" error={error('stoppedOn')}>
        <DateInput {...register('stoppedOn')} />
      </Field>
    </>
  );
};

const SmokingFields = ({ status }: { status: FileForm['status'] }) => {
  const { register, error } = useErrors();
  return (
    <>
      <Field label="Smoking" error={error('status')}>
        <Select {...register('status')} emptyLabel="Choose one" choices={choicesOf(smokingStatuses, smokingLabels)} />
      </Field>
      {status !== 'never' && (
        <Field label="Pack-years" labelNote="optional" error={error('packYears')}>
          <TextInput {...register('packYears')} inputMode="decimal" autoComplete="off" />
        </Field>
      )}
      {status === 'former' && (
        <Field label="Stopped on" labelNote="optional" error={error('quitOn')}>
          <DateInput {...register('quitOn')} />
        </Field>
      )}
    </>
  );
};

/** What each kind of entry asks. */
export const KindFields = ({ kind, patient, status }: KindFieldsProps) => {
  const fields: Record<FileEntryKind, ReactNode> = {
    diagnosis: <DiagnosisFields />,
    exacerbation: <ExacerbationFields />,
    'oxygen-order': <OxygenFields mayOrder={patient.abilities.includes('order-oxygen')} />,
    medicine: <MedicineFields />,
    'heart-rhythm': <YesNoField name="atrialFibrillation" legend="Atrial fibrillation" />,
    smoking: <SmokingFields status={status} />,
    'safety-hold': <HoldField />,
  };
  return fields[kind];
};
