import { useFormContext } from 'react-hook-form';
import { Icon } from '../../../ui/icon';
import { VisuallyHidden } from '../../../ui/visually-hidden';
import type { FormQuestion } from '../forms/form-question';
import { bestPreview } from './best-preview';
import { ManeuverRow, rowErrorId } from './maneuver-row';
import { rowCount, type SetName, type SpirometryForm } from './spirometry-form';

interface ManeuverGridProps {
  set: SetName;
  title: string;
  values: SpirometryForm;
  questions: readonly FormQuestion[];
}

const rowFields = ['fev1', 'fvc', 'pef', 'fef2575', 'time', 'reason'] as const;

const head = 'border-b border-rule px-2 pb-2 align-bottom text-head text-ink-soft';

export const ManeuverGrid = ({ set, title, values, questions }: ManeuverGridProps) => {
  const { formState } = useFormContext<SpirometryForm>();
  const { fev1Row, fvcRow } = bestPreview(values[set]);
  const asked = new Set(questions.map((question) => question.field));
  const rowErrors = Array.from({ length: rowCount }, (_, index) => {
    const row = formState.errors[set]?.rows?.[index];
    const message = rowFields.map((field) => row?.[field]?.message).find((words) => words !== undefined);
    return message === undefined ? null : { index, message };
  }).filter((error) => error !== null);

  return (
    <>
      <div className="scroll-pl-8 overflow-x-auto">
        <table className="w-full min-w-150 table-fixed border-collapse">
          <VisuallyHidden as="caption">{title}</VisuallyHidden>
          <thead>
            <tr>
              <th scope="col" className={`${head} sticky left-0 z-1 w-7 bg-surface pl-0`}>
                <VisuallyHidden>Maneuver</VisuallyHidden>
              </th>
              <th scope="col" className={`${head} text-right`}>
                FEV1, L
              </th>
              <th scope="col" className={`${head} text-right`}>
                FVC, L
              </th>
              <th scope="col" className={`${head} w-16 text-right`}>
                Ratio
              </th>
              <th scope="col" className={`${head} text-right`}>
                PEF, L/s
              </th>
              {values.withFef && (
                <th scope="col" className={`${head} text-right`}>
                  FEF25-75, L/s
                </th>
              )}
              <th scope="col" className={`${head} text-right`}>
                Time, s
              </th>
              <th scope="col" className={`${head} w-14 text-center`}>
                FEV1 used
              </th>
              <th scope="col" className={`${head} w-14 text-center`}>
                FVC used
              </th>
              <th scope="col" className={`${head} w-40 text-left`}>
                Note
              </th>
            </tr>
          </thead>
          <tbody>
            {values[set].rows.map((row, index) => (
              <ManeuverRow
                key={index}
                set={set}
                index={index}
                row={row}
                withFef={values.withFef}
                bestFev1={index === fev1Row}
                bestFvc={index === fvcRow}
                askedFields={asked}
              />
            ))}
          </tbody>
        </table>
      </div>
      {rowErrors.map(({ index, message }) => (
        <p
          key={index}
          id={rowErrorId(set, index)}
          role="alert"
          className="flex items-center gap-2 text-note text-rowan"
        >
          <Icon name="alert" size={16} />
          {`Maneuver ${index + 1}: ${message}`}
        </p>
      ))}
    </>
  );
};
