import { addDays } from '@slighthill/shared/calendar';
import type { TrendEnrollment } from './types';

const finished: readonly string[] = ['completed', 'partly-completed', 'withdrawn'];
const daysAfterLastSession = 28;

/**
 * The enrollment a trend is read against (rule TR-1 e): the one asked for, else the active one, else the most recent,
 * else none. One that was asked for and does not exist is none.
 */
export function chooseEnrollment(
  enrollments: readonly TrendEnrollment[],
  askedFor: string | undefined,
): TrendEnrollment | null {
  if (askedFor !== undefined) return enrollments.find((enrollment) => enrollment.id === askedFor) ?? null;
  const newest = (list: readonly TrendEnrollment[]) =>
    list.reduce<TrendEnrollment | null>((best, item) => (best && best.startOn >= item.startOn ? best : item), null);
  return newest(enrollments.filter((enrollment) => enrollment.status === 'active')) ?? newest(enrollments);
}

/** Day the baseline is looked for (rule TR-1 e): first attended exercise session, before that the start date. */
export const anchorOf = (enrollment: TrendEnrollment | null): string | null =>
  enrollment ? (enrollment.firstExerciseOn ?? enrollment.startOn) : null;

/** Last day a test still belongs to a finished enrollment (rule TR-1 g); its end stands in where no session is known. */
export function latestAllowedOn(enrollment: TrendEnrollment | null): string | null {
  if (!enrollment || !finished.includes(enrollment.status)) return null;
  const last = enrollment.lastSessionOn ?? enrollment.endOn;
  return last === null ? null : addDays(last, daysAfterLastSession);
}
