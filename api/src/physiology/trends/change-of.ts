import { formatNumber, snap } from '@slighthill/shared/format';
import type { Measure, VariabilityInterval, VariabilityThreshold } from '@slighthill/shared/measures';
import { variabilityInterval, variabilityThreshold } from '../change/variability-row';
import type { TrendChange, Verdict, Yardstick } from './types';

interface Dated {
  takenAt: string;
  value: number;
}

export interface ChangeResult {
  change: TrendChange;
  zone: number | null;
  notes: string[];
}

/**
 * Change from baseline to latest and its verdict (rule TR-8): better or worse needs the important difference, where one
 * is adopted, and the test's own variability, where rule GR-11 has a row; with neither it is not judged. The difference
 * is taken in the raw unit and snapped. The zone is the largest threshold that applies, in the raw unit.
 * @example COPD, FEV1 1.52 to 1.62 L over nine months: +0.10 L, 6.6 percent, within variation
 */
export function changeOf(measure: Measure, baseline: Dated, latest: Dated, diagnosisGroup: string): ChangeResult {
  const absolute = snap(latest.value - baseline.value);
  const relativePercent = baseline.value === 0 ? null : snap((100 * absolute) / baseline.value);
  const interval = variabilityInterval(baseline.takenAt, latest.takenAt);
  const row = variabilityThreshold(measure, interval, diagnosisGroup);
  const difference = measure.importantDifference;
  const yardsticks: Yardstick[] = [];
  if (difference)
    yardsticks.push({
      id: 'important-difference',
      label: 'Important difference',
      threshold: difference.value,
      unit: measure.unit.symbol,
      reached: Math.abs(absolute) >= difference.value,
    });
  if (row) yardsticks.push(variabilityYardstick(measure, row, interval, diagnosisGroup, { absolute, relativePercent }));
  const verdict = verdictOf(measure, absolute, yardsticks);
  const zone = zoneOf(baseline.value, difference?.value ?? null, row);
  const notes = measure.variability && !row ? ['No published variability for this interval.'] : [];
  const second = absoluteYardstick(measure, interval, diagnosisGroup, absolute);
  if (second) {
    yardsticks.push(second);
    const milliliters = formatNumber(second.threshold * measure.storage.perUnit, 0);
    notes.push(
      `The change ${second.reached ? 'exceeds' : 'does not exceed'} ${milliliters} mL, what COPD varies by between sessions.`,
    );
  }
  return { change: { absolute, relativePercent, verdict, yardsticks }, zone, notes };
}

function verdictOf(measure: Measure, absolute: number, yardsticks: readonly Yardstick[]): Verdict {
  if (yardsticks.length === 0 || measure.direction === 'none') return 'not-judged';
  if (absolute === 0 || !yardsticks.every((yardstick) => yardstick.reached)) return 'within-variation';
  return absolute > 0 === (measure.direction === 'higher') ? 'better' : 'worse';
}

const intervalWords: Record<VariabilityInterval, string> = {
  'within-a-day': 'within a day',
  'week-to-week': 'week to week',
  'year-to-year': 'year to year',
};

function variabilityYardstick(
  measure: Measure,
  row: VariabilityThreshold,
  interval: VariabilityInterval,
  diagnosisGroup: string,
  change: { absolute: number; relativePercent: number | null },
): Yardstick {
  const size = Math.abs(row.quantity === 'raw' ? change.absolute : (change.relativePercent ?? 0));
  return {
    id: 'test-variability',
    label: `Test variability, ${intervalWords[interval]}, ${diagnosisGroup === 'copd' ? 'COPD' : 'not COPD'}`,
    threshold: row.value,
    unit: row.quantity === 'raw' ? measure.unit.symbol : '%',
    reached: row.strict ? size > row.value : size >= row.value,
  };
}

function absoluteYardstick(
  measure: Measure,
  interval: VariabilityInterval,
  diagnosisGroup: string,
  absolute: number,
): Yardstick | null {
  const second = measure.absoluteYardstick;
  if (!second || second.diagnosisGroup !== diagnosisGroup || interval === 'within-a-day') return null;
  return {
    id: 'copd-between-sessions',
    label: 'COPD, between sessions',
    threshold: second.value,
    unit: measure.unit.symbol,
    reached: Math.abs(absolute) >= second.value,
  };
}

function zoneOf(baseline: number, difference: number | null, row: VariabilityThreshold | null): number | null {
  const variation = row && (row.quantity === 'raw' ? row.value : (row.value / 100) * Math.abs(baseline));
  if (difference === null && variation === null) return null;
  return snap(Math.max(difference ?? 0, variation ?? 0));
}
