import type { TrendSeries } from '@slighthill/shared/contracts/trend';
import { SmallTrend } from '../../charts/small-trend';
import { formatDayMonth } from '../../lib/clinic-time';
import { AlsoOnRecord, hasChangeToShow } from './also-on-record';

interface SinceBaselineProps {
  all: readonly TrendSeries[];
  /** The one in the large chart. */
  current: TrendSeries;
  onChoose: (measure: string) => void;
}

/** The baseline's date when all of them share it. */
const commonDate = (all: readonly TrendSeries[]): string | null => {
  const dates = new Set(all.flatMap((series) => (series.baseline ? [series.baseline.takenOn] : [])));
  const [only] = dates;
  return dates.size === 1 && only ? formatDayMonth(only) : null;
};

/** Every other change as a small chart, what has none as a line; choosing one brings it into the large chart. */
export const SinceBaseline = ({ all, current, onChoose }: SinceBaselineProps) => {
  const others = all.filter((series) => series.measure !== current.measure);
  const changed = others.filter(hasChangeToShow);
  const rest = others.filter((series) => !hasChangeToShow(series));
  const date = commonDate(changed);
  return (
    <>
      {changed.length > 0 && (
        <section aria-label="Since baseline" className="mt-6 border-t border-line pt-4 print:mt-3 print:pt-2">
          <div className="flex flex-wrap items-baseline gap-x-4">
            <h2 className="text-chart">{date ? `Since baseline, ${date}` : 'Since baseline'}</h2>
            <p className="text-note text-ink-soft">Shaded: change too small to count</p>
          </div>
          <ul className="mt-3 print:mt-1 grid grid-cols-[repeat(auto-fill,minmax(248px,1fr))] gap-x-6 gap-y-5 print:grid-cols-4 print:gap-x-3 print:gap-y-2">
            {changed.map((series) => (
              <li key={series.measure} data-print="together">
                <SmallTrend series={series} onChoose={() => onChoose(series.measure)} />
              </li>
            ))}
          </ul>
        </section>
      )}
      <AlsoOnRecord series={rest} onChoose={onChoose} />
    </>
  );
};
