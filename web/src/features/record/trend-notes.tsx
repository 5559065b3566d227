import type { TrendSeries } from '@slighthill/shared/contracts/trend';
import { formatChange } from '@slighthill/shared/format';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';

interface TrendNotesProps {
  series: TrendSeries;
}

/** Rule TR-5: volumes in milliliters a year, everything else with one decimal more than its results. */
const rateWords = ({ measure, unit, ratePerYear }: TrendSeries): string | null => {
  if (!ratePerYear || !isMeasureId(measure)) return null;
  const { storage, decimals } = getMeasure(measure);
  const fine = storage.perUnit !== 1;
  const write = (value: number) => formatChange(fine ? value * storage.perUnit : value, fine ? 1 : decimals + 1);
  const per = [fine ? storage.unit : unit, 'a year'].filter((word) => word !== '').join(' ');
  return `Rate ${write(ratePerYear.value)} ${per} (95% interval ${write(ratePerYear.low)} to ${write(ratePerYear.high)}).`;
};

/** Percent predicted moves by itself as the predicted value falls with age, so its rate is said beside the raw one. */
const percentRateWords = ({ percentPredictedRatePerYear: rate }: TrendSeries): string | null => {
  if (!rate) return null;
  const write = (value: number) => formatChange(value, 1);
  return `Percent predicted ${write(rate.value)} percentage points a year (95% interval ${write(rate.low)} to ${write(rate.high)}).`;
};

/** What was left out of the comparison and why, and how fast the value changes. */
export const TrendNotes = ({ series }: TrendNotesProps) => {
  const rates = [rateWords(series), percentRateWords(series)].filter((words) => words !== null);
  const notes = [...rates, ...series.notes];
  return (
    <div className="text-note text-ink-soft">
      {notes.length === 0 ? (
        <p>All points are compared.</p>
      ) : (
        <ul aria-label="Notes on this trend">
          {notes.map((note) => {
            const [head, tail] = note.startsWith('The newest') ? [note, ''] : splitAtColon(note);
            return (
              <li key={note}>
                {tail === '' ? (
                  head
                ) : (
                  <>
                    <strong className="font-semibold text-ink">{head}:</strong>
                    {tail}
                  </>
                )}
              </li>
            );
          })}
        </ul>
      )}
    </div>
  );
};

const splitAtColon = (note: string): [string, string] => {
  const at = note.indexOf(':');
  return at < 0 ? [note, ''] : [note.slice(0, at), note.slice(at + 1)];
};
