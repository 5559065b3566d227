import { measures, type MeasureId } from '@slighthill/shared/measures';
import { computeTrends } from '../physiology/trends/compute-trends';
import type { TrendClinic } from '../physiology/trends/types';
import type { TrendSource } from './trend-source';

export interface EnrollmentSummary {
  pattern: { id: string; heading: string; provisional: boolean; takenOn: string; bandId: string | null } | null;
  measures: Record<
    string,
    {
      baseline: { value: number; takenOn: string } | null;
      latest: { value: number; takenOn: string } | null;
      absolute: number | null;
      verdict: string | null;
    }
  >;
  lastTestOn: string | null;
}

/** What lists and headers show of one enrollment, taken from the trend computation with the clinic's own rules. */
export function summaryOf(source: TrendSource, clinic: TrendClinic, enrollmentId: string): EnrollmentSummary {
  const present = new Set(source.measurements.map((row) => row.measure));
  const ids: MeasureId[] = measures.map((measure) => measure.id).filter((id) => present.has(id));
  const trends = computeTrends({ ...source, clinic, options: { measures: ids, enrollment: enrollmentId } });
  const { pattern } = trends;
  return {
    pattern: pattern && {
      id: pattern.id,
      heading: pattern.heading,
      provisional: pattern.provisional,
      takenOn: pattern.values.takenOn,
      bandId: pattern.severity?.bandId ?? null,
    },
    measures: Object.fromEntries(
      trends.series.map((series) => [
        series.measure,
        {
          baseline: brief(series.baseline),
          latest: brief(series.latest),
          absolute: series.change?.absolute ?? null,
          verdict: series.change?.verdict ?? null,
        },
      ]),
    ),
    lastTestOn: source.measurements.at(-1)?.takenOn ?? null,
  };
}

const brief = (point: { value: number; takenOn: string } | null) =>
  point && { value: point.value, takenOn: point.takenOn };
