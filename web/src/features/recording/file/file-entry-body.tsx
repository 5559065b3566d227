import { fileEntryKindLabels, fileEntryKinds, type FileEntryKind } from '@slighthill/shared/contracts/file-entry';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { useFormContext } from 'react-hook-form';
import { DateInput } from '../../../ui/date-input';
import { Field } from '../../../ui/field';
import { Select } from '../../../ui/select';
import { TextArea } from '../../../ui/text-area';
import type { FileForm } from './file-form';
import { dateLabels } from './file-words';
import { KindFields } from './kind-fields';

interface FileEntryBodyProps {
  patient: Pick<Patient, 'abilities'>;
  values: FileForm;
  amending: boolean;
}

const kindsFor = (patient: Pick<Patient, 'abilities'>): FileEntryKind[] =>
  fileEntryKinds.filter((kind) => kind === 'oxygen-order' || patient.abilities.includes('write-file'));

export const FileEntryBody = ({ patient, values, amending }: FileEntryBodyProps) => {
  const { register, formState } = useFormContext<FileForm>();
  const { errors } = formState;
  const { kind } = values;
  return (
    <>
      <div className="grid gap-x-4 gap-y-3 row:grid-cols-2">
        {!amending && (
          <Field label="What to enter" error={errors.kind?.message}>
            <Select
              {...register('kind')}
              emptyLabel="Choose one"
              choices={kindsFor(patient).map((value) => ({ value, label: fileEntryKindLabels[value] }))}
            />
          </Field>
        )}
        {kind !== '' && (
          <Field label={dateLabels[kind]} error={errors.on?.message}>
            <DateInput {...register('on')} />
          </Field>
        )}
      </div>
      {kind !== '' && (
        <>
          <div className="grid gap-x-4 gap-y-3 row:grid-cols-2">
            <KindFields kind={kind} patient={patient} status={values.status} />
          </div>
          <Field label="Note" labelNote="optional" error={errors.note?.message}>
            <TextArea {...register('note')} rows={2} />
          </Field>
        </>
      )}
    </>
  );
};
