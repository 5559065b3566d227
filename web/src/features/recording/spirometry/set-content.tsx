import { useFormContext } from 'react-hook-form';
import { Checkbox } from '../../../ui/checkbox';
import { Segmented } from '../../../ui/segmented';
import type { FormQuestion } from '../forms/form-question';
import { BestValuesFields } from './best-values-fields';
import { ManeuverGrid } from './maneuver-grid';
import type { SetName, SpirometryForm } from './spirometry-form';

interface SetContentProps {
  set: SetName;
  title: string;
  values: SpirometryForm;
  questions: readonly FormQuestion[];
}

const entries = [
  { value: 'maneuvers', label: 'Maneuvers' },
  { value: 'best', label: 'Best values only' },
] as const;

/** Eight numbered rows, or the four best values of a report. What the other way holds stays where it is. */
export const SetContent = ({ set, title, values, questions }: SetContentProps) => {
  const { register, setValue } = useFormContext<SpirometryForm>();
  const { entry } = values[set];
  return (
    <div className="flex flex-col gap-3">
      <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1">
        <Segmented
          label={`How ${title.toLowerCase()} is entered`}
          choices={entries}
          value={entry}
          onValueChange={(value) => setValue(`${set}.entry`, value, { shouldDirty: true })}
        />
        {entry === 'maneuvers' && <Checkbox {...register('withFef')} label="FEF25-75 column" />}
      </div>
      {entry === 'best' ? (
        <BestValuesFields set={set} questions={questions} />
      ) : (
        <ManeuverGrid set={set} title={title} values={values} questions={questions} />
      )}
    </div>
  );
};
