import { useFormContext, useWatch, type FieldPathByValue } from 'react-hook-form';
import { Icon } from '../../../ui/icon';
import type { SpirometryForm } from './spirometry-form';

interface UsedToggleProps {
  path: FieldPathByValue<SpirometryForm, boolean>;
  /** Spoken name: "Maneuver 4, FEV1 used". */
  name: string;
}

/** Whether this blow's value is acceptable: a drawn check or cross over a real checkbox. */
export const UsedToggle = ({ path, name }: UsedToggleProps) => {
  const { control, register } = useFormContext<SpirometryForm>();
  const used = useWatch({ control, name: path });
  return (
    <label className="relative mx-auto flex size-8 cursor-pointer items-center justify-center rounded-cell hover:bg-mist has-focus-visible:outline-2 has-focus-visible:outline-tarn">
      <input
        {...register(path)}
        type="checkbox"
        aria-label={name}
        className="absolute inset-0 size-full cursor-pointer opacity-0"
      />
      <Icon name={used ? 'check' : 'close'} size={16} className={used ? 'text-fern' : 'text-rowan'} />
    </label>
  );
};
