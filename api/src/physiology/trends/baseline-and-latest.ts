import { addDays, daysBetween } from '@slighthill/shared/calendar';

export interface Window {
  /** Null without an enrollment. */
  anchorOn: string | null;
  /** Last day that counts, for a finished enrollment. */
  lastAllowedOn: string | null;
}

export interface Pair<T> {
  baseline: T | null;
  latest: T | null;
  note: string | null;
}

const baselineDays = 90;

/**
 * Baseline and latest among comparable days, oldest first (rule TR-1 f and g). Baseline: the last day in the 90 days up
 * to and including the anchor, else the first after it, else the last before; without an anchor the first. Latest: the
 * last day after the baseline, for a finished enrollment not later than its last allowed day.
 */
export function baselineAndLatest<T extends { takenOn: string }>(days: readonly T[], window: Window): Pair<T> {
  const { baseline, note } = baselineOf(days, window.anchorOn);
  if (!baseline) return { baseline: null, latest: null, note: null };
  const { lastAllowedOn } = window;
  const latest = days.findLast(
    (day) => day.takenOn > baseline.takenOn && (lastAllowedOn === null || day.takenOn <= lastAllowedOn),
  );
  return { baseline, latest: latest ?? null, note };
}

function baselineOf<T extends { takenOn: string }>(
  days: readonly T[],
  anchorOn: string | null,
): { baseline: T | null; note: string | null } {
  if (anchorOn === null) return { baseline: days[0] ?? null, note: null };
  const from = addDays(anchorOn, -baselineDays);
  const inWindow = days.findLast((day) => day.takenOn >= from && day.takenOn <= anchorOn);
  if (inWindow) return { baseline: inWindow, note: null };
  const after = days.find((day) => day.takenOn > anchorOn);
  if (after) return { baseline: after, note: 'Baseline is the first test after the start.' };
  const before = days.findLast((day) => day.takenOn < from);
  if (!before) return { baseline: null, note: null };
  return { baseline: before, note: `Baseline is ${daysBetween(before.takenOn, anchorOn)} days before the start.` };
}
