import { Controller, useFormContext } from 'react-hook-form';
import { RadioGroup } from '../../../ui/radio-group';
import type { FileForm } from './file-form';

interface YesNoFieldProps {
  name: 'atrialFibrillation';
  legend: string;
}

const choices = [
  { value: 'yes', label: 'Yes' },
  { value: 'no', label: 'No' },
] as const;

export const YesNoField = ({ name, legend }: YesNoFieldProps) => {
  const { control, formState } = useFormContext<FileForm>();
  return (
    <Controller
      control={control}
      name={name}
      render={({ field }) => (
        <RadioGroup
          name={field.name}
          legend={legend}
          choices={choices}
          value={field.value === '' ? null : field.value}
          onValueChange={field.onChange}
          error={formState.errors[name]?.message}
        />
      )}
    />
  );
};
