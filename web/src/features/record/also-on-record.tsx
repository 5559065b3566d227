import type { TrendSeries } from '@slighthill/shared/contracts/trend';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { formatResult, formatValue } from '../../charts/format-measure';
import { stateWords } from '../../charts/rule-words';
import { formatDayMonth } from '../../lib/clinic-time';

/** A change worth drawing: there is a pair, and the measure has a better direction. */
export const hasChangeToShow = (series: TrendSeries): boolean =>
  series.latest !== null && isMeasureId(series.measure) && getMeasure(series.measure).direction !== 'none';

/** The newest that may be compared stands for the series. */
const shownPoint = ({ latest, baseline, points }: TrendSeries) => latest ?? baseline ?? points.at(-1);

const resultWords = (series: TrendSeries): string => {
  const { baseline, latest, measure, unit } = series;
  const last = shownPoint(series);
  if (!last) return 'no result';
  const shown = formatResult(measure, last.value, unit);
  return baseline && latest ? `${formatValue(measure, baseline.value)} to ${shown}` : shown;
};

const dateWords = (series: TrendSeries): string => {
  const { baseline, latest } = series;
  if (baseline && latest) return `${formatDayMonth(baseline.takenOn)} to ${formatDayMonth(latest.takenOn)}`;
  const last = shownPoint(series);
  if (!last) return '';
  return series.points.length === 1 ? `once, ${formatDayMonth(last.takenOn)}` : formatDayMonth(last.takenOn);
};

const stateOf = (series: TrendSeries): string => {
  const state = shownPoint(series)?.state ?? null;
  return state === null ? '' : stateWords[state];
};

interface AlsoOnRecordProps {
  series: readonly TrendSeries[];
  onChoose: (measure: string) => void;
}

/** What has no change to draw, one line each: taken once, or without a better direction. */
export const AlsoOnRecord = ({ series, onChoose }: AlsoOnRecordProps) => {
  if (series.length === 0) return null;
  return (
    <section aria-label="Also on record" className="mt-6 border-t border-line pt-4 print:mt-3 print:pt-2">
      <h2 className="text-chart">Also on record</h2>
      <ul className="mt-2 grid gap-x-6 row:grid-cols-2 print:mt-0 print:grid-cols-3">
        {series.map((one) => (
          <li key={one.measure} className="border-b border-row" data-print="together">
            <button
              type="button"
              onClick={() => onChoose(one.measure)}
              className="flex min-h-9 w-full flex-wrap items-baseline gap-x-3 rounded-control py-1 text-left transition-colors duration-120 hover:bg-mist print:min-h-0"
            >
              <span className="min-w-24 font-semibold print:min-w-0">
                {isMeasureId(one.measure) ? getMeasure(one.measure).shortLabel : one.measure}
              </span>
              <span className="grow">{resultWords(one)}</span>
              <span className="text-note text-ink-soft">
                {[stateOf(one), dateWords(one)].filter((words) => words !== '').join(', ')}
              </span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
};
