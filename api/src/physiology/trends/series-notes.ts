import { dateInWords } from '@slighthill/shared/calendar';
import type { ReferenceSet } from '../reference-sets/types';
import type { Comparable } from './comparable';
import { predictionReasons } from './reasons';
import type { Evaluation } from './evaluator';
import type { TrendPoint } from './types';

const sameDay = ['the best of the day counts', 'the last of the day counts'];
const points = (count: number) => (count === 1 ? '1 point' : `${count} points`);

/** What was left out and why, the newest test first when it is among them (rule TR-1 d). */
export function leftOutNotes(all: readonly TrendPoint[]): string[] {
  const notes: string[] = [];
  const newest = all.at(-1);
  if (newest && !newest.compared && newest.reason && !sameDay.includes(newest.reason))
    notes.push(`The newest test, of ${dateInWords(newest.takenOn)}, is not compared: ${newest.reason}.`);
  const counts = new Map<string, number>();
  for (const { compared, reason } of all) if (!compared && reason) counts.set(reason, (counts.get(reason) ?? 0) + 1);
  for (const [reason, count] of counts) notes.push(`${points(count)} not compared: ${reason}.`);
  return notes;
}

/** Why there is no pair to compare. */
export function noPairNotes({ days, pair }: Comparable, lastAllowedOn: string | null): string[] {
  if (pair.latest || days.length === 0) return [];
  if (days.length === 1) return ['One test so far, nothing to compare yet.'];
  const late = lastAllowedOn !== null && days.some((day) => day.takenOn > lastAllowedOn);
  return [late ? 'No comparable test up to 28 days after the last session.' : 'No comparable test after the baseline.'];
}

/** Points without a percent predicted, and the age at which NHANES III changes its equation (rule TR-7). */
export function predictionNotes(evaluations: readonly Evaluation[], set: ReferenceSet | null, sex: string): string[] {
  if (!set) return [];
  const counts = new Map<string, number>();
  for (const { reason } of evaluations)
    if (reason) {
      const words = predictionReasons[reason];
      counts.set(words, (counts.get(words) ?? 0) + 1);
    }
  const notes = [...counts].map(([words, count]) => `No percent predicted for ${points(count)}: ${words}.`);
  if (set.id !== 'nhanes-iii-1999' || evaluations.length === 0) return notes;
  const isUnder20 = ({ ageYears }: Evaluation) => ageYears < 20;
  if (sex === 'male' && evaluations.some(isUnder20) && !evaluations.every(isUnder20))
    notes.push('NHANES III changes its equation at the 20th birthday, which lies within this series.');
  notes.push('NHANES III publishes no z-score; the one shown is approximate.');
  return notes;
}
