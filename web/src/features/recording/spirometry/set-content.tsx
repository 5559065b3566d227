import { useFormContext } from 'react-hook-form';
import { Checkbox } from '../../../ui/checkbox';
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

/** Eight numbered rows, or the four best values of a report. */
export const SetContent = ({ set, title, values, questions }: SetContentProps) => {
  const { register } = useFormContext<SpirometryForm>();
  if (values[set].entry === 'best') return <BestValuesFields set={set} questions={questions} />;
  return (
    <div>
      <ManeuverGrid set={set} title={title} values={values} questions={questions} />
      <Checkbox {...register('withFef')} label="FEF25-75 column" className="mt-1 text-note" />
    </div>
  );
};
