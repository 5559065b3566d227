import type { Measure } from '@slighthill/shared/measures';
import type { BronchodilatorState } from '../pattern/judge-pattern';
import { baselineAndLatest, type Pair, type Window } from './baseline-and-latest';
import { blockingKey } from './condition-words';
import type { TrendMeasurement } from './types';

const stateOrder: readonly BronchodilatorState[] = ['after', 'before', 'none', 'unknown'];
const lowQuality: readonly string[] = ['D', 'E'];
const goodQuality: readonly string[] = ['A', 'B', 'C'];

export interface Comparable {
  state: BronchodilatorState | null;
  /** A result of the group, whose conditions the others share; null when nothing is comparable. */
  example: TrendMeasurement | null;
  blocking: string;
  /** One result a day, oldest first (rule TR-1 c). */
  days: readonly TrendMeasurement[];
  pair: Pair<TrendMeasurement>;
}

/** Quality A to C or not graded counts; D and E only when asked for; U and F never (rule TR-1 b). */
export const qualityCounts = (quality: string | null, includeLowQuality: boolean): boolean =>
  quality === null || goodQuality.includes(quality) || (includeLowQuality && lowQuality.includes(quality));

/** A spirometry result that says nothing of a bronchodilator is "unknown". */
export const stateOf = (measure: Measure, result: TrendMeasurement): BronchodilatorState | null =>
  measure.usesBronchodilatorState ? (result.state ?? 'unknown') : null;

/** The day's value: the last, or the best for repeated walks. */
export function oneADay(measure: Measure, results: readonly TrendMeasurement[]): TrendMeasurement[] {
  const days: TrendMeasurement[] = [];
  const better = (value: number, than: number) => (measure.direction === 'lower' ? value < than : value > than);
  for (const result of results) {
    const last = days.at(-1);
    if (last?.takenOn !== result.takenOn) days.push(result);
    else if (measure.sameDay === 'last' || better(result.value, last.value)) days[days.length - 1] = result;
  }
  return days;
}

/**
 * Which results of a measure are compared (rule TR-1 b to g). The first state of after, before, none, unknown that holds
 * a baseline and a later day, and within it the newest set of blocking conditions that does; failing that, the state and
 * conditions of the newest result, with no latest. `state` overrides the choice of state.
 */
export function chooseComparable(
  measure: Measure,
  results: readonly TrendMeasurement[],
  window: Window,
  options: { state?: BronchodilatorState | undefined; includeLowQuality?: boolean | undefined },
): Comparable {
  const counted = results.filter((result) => qualityCounts(result.quality, options.includeLowQuality ?? false));
  const asked = measure.usesBronchodilatorState ? (options.state ?? null) : null;
  const ofState = (state: BronchodilatorState | null) => counted.filter((item) => stateOf(measure, item) === state);
  const states = asked ? [asked] : measure.usesBronchodilatorState ? stateOrder : [null];
  for (const state of states) {
    const found = newestGroupWithPair(measure, state, ofState(state), window);
    if (found) return found;
  }
  const newest = (asked ? ofState(asked) : counted).at(-1) ?? null;
  const state =
    asked ?? (newest ? stateOf(measure, newest) : results.at(-1) ? stateOf(measure, results.at(-1)!) : null);
  const blocking = newest ? blockingKey(measure, newest.conditions) : '';
  const group = newest ? ofState(state).filter((item) => blockingKey(measure, item.conditions) === blocking) : [];
  const days = oneADay(measure, group);
  return { state, example: newest, blocking, days, pair: { ...baselineAndLatest(days, window), latest: null } };
}

function newestGroupWithPair(
  measure: Measure,
  state: BronchodilatorState | null,
  results: readonly TrendMeasurement[],
  window: Window,
): Comparable | null {
  const groups = new Map<string, TrendMeasurement[]>();
  for (const result of results) {
    const key = blockingKey(measure, result.conditions);
    const group = groups.get(key);
    if (group) group.push(result);
    else groups.set(key, [result]);
  }
  const newestFirst = [...groups].sort(([, a], [, b]) => (lastAt(a) < lastAt(b) ? 1 : -1));
  for (const [blocking, group] of newestFirst) {
    const days = oneADay(measure, group);
    const pair = baselineAndLatest(days, window);
    if (pair.latest) return { state, example: group[0] ?? null, blocking, days, pair };
  }
  return null;
}

const lastAt = (group: readonly TrendMeasurement[]): string => group.at(-1)?.takenAt ?? '';
