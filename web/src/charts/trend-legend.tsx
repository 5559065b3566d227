import type { TrendPoint } from '@slighthill/shared/contracts/trend';
import { ChartMark } from './chart-mark';
import { legendEntries } from './mark-kind';

interface TrendLegendProps {
  points: readonly TrendPoint[];
  /** Size of the important difference, where the plot had no room for its words. */
  difference: string | null;
}

export const TrendLegend = ({ points, difference }: TrendLegendProps) => (
  <ul aria-label="Marks" className="flex flex-wrap gap-x-4 gap-y-1 text-note text-ink-soft">
    {legendEntries(points).map(({ kind, words }) => (
      <li key={kind} className="inline-flex items-center gap-2">
        <svg aria-hidden="true" width={14} height={14} viewBox="0 0 14 14" className="shrink-0">
          <ChartMark kind={kind} x={7} y={7} />
        </svg>
        {words}
      </li>
    ))}
    {difference !== null && (
      <li className="inline-flex items-center gap-2">
        <svg aria-hidden="true" width={14} height={14} viewBox="0 0 14 14" className="shrink-0">
          <path d="M10 1H5V13H10" fill="none" stroke="var(--tarn)" strokeWidth={1.6} />
        </svg>
        important difference, {difference}
      </li>
    )}
  </ul>
);
