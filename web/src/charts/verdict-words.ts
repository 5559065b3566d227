import type { TrendSeries, Verdict } from '@slighthill/shared/contracts/trend';
import { roundHalfAway } from '@slighthill/shared/format';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { formatAmount, formatValue } from './format-measure';

export interface VerdictWords {
  verdict: Verdict | null;
  /** "Better by 42 m", "Within expected variation". */
  words: string;
  icon: 'rising' | 'falling' | 'flat';
}

const none = 'One test so far, nothing to compare yet';

/** The verdict as screens say it (rule TR-8). The rising icon means better, whatever the direction of the number. */
export const verdictWords = (series: TrendSeries): VerdictWords => {
  const { change, measure, unit } = series;
  if (!change) {
    const words = series.points.length === 1 ? none : 'No comparable pair, nothing to compare yet';
    return { verdict: null, words, icon: 'flat' };
  }
  const amount = formatAmount(measure, change.absolute, unit);
  if (change.verdict === 'better') return { verdict: 'better', words: `Better by ${amount}`, icon: 'rising' };
  if (change.verdict === 'worse') return { verdict: 'worse', words: `Worse by ${amount}`, icon: 'falling' };
  if (change.verdict === 'not-judged') return { verdict: 'not-judged', words: 'Not judged', icon: 'flat' };
  const tested = isMeasureId(measure) && getMeasure(measure).variability !== null;
  const words = tested ? 'Within expected variation' : 'Too small to count';
  return { verdict: 'within-variation', words, icon: 'flat' };
};

/** "0.06 L up since baseline"; nothing when there is no pair. */
export const changeWords = (series: TrendSeries): string | null => {
  const { change, measure, unit } = series;
  if (!change) return null;
  const decimals = isMeasureId(measure) ? getMeasure(measure).decimals : 2;
  const rounded = roundHalfAway(change.absolute, decimals);
  if (rounded === 0) return 'no change since baseline';
  return `${formatAmount(measure, change.absolute, unit)} ${rounded > 0 ? 'up' : 'down'} since baseline`;
};

/** "310 to 352, 30 or more counts". */
export const fromToWords = (series: TrendSeries): string | null => {
  const { baseline, latest, measure, zone } = series;
  if (!baseline || !latest) return null;
  const pair = `${formatValue(measure, baseline.value)} to ${formatValue(measure, latest.value)}`;
  return zone === null ? `${pair}, no agreed difference` : `${pair}, ${formatValue(measure, zone)} or more counts`;
};
