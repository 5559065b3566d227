import type { Enrollment, Patient } from '@slighthill/shared/contracts/patient';
import { formatNumber } from '@slighthill/shared/format';
import { formatDate, formatDayMonth } from '../../lib/clinic-time';

export const enrollmentStatusLabels: Record<Enrollment['status'], string> = {
  planned: 'Planned',
  active: 'Active',
  paused: 'Paused',
  completed: 'Completed',
  'partly-completed': 'Partly completed',
  withdrawn: 'Withdrawn',
};

/** Where Details offers to enroll. */
export const enrollHash = '#enroll';

/** The course in the standing header: "Since Sep 14, 24 sessions". */
export const courseWords = (enrollment: Enrollment | null, today: string): string => {
  if (!enrollment) return 'Not enrolled';
  const sessions = `${enrollment.plannedSessions} sessions`;
  const start = formatDayMonth(enrollment.startOn);
  if (enrollment.status === 'planned')
    return `${enrollment.startOn < today ? 'Planned,' : 'Starts'} ${start}, ${sessions}`;
  if (enrollment.status === 'active') return `Since ${start}, ${sessions}`;
  if (enrollment.status === 'paused') return `Paused, since ${start}`;
  const end = enrollment.endedOn ? ` ${formatDate(enrollment.endedOn)}` : '';
  return `${enrollmentStatusLabels[enrollment.status]}${end}`;
};

const flow = (lpm: number): string => `${formatNumber(lpm, Number.isInteger(lpm) ? 0 : 1)} L/min`;

/** "2 L/min when walking", "1 L/min at rest, 2 L/min when walking". */
export const oxygenWords = (oxygen: Patient['oxygen']): string => {
  if (!oxygen) return 'No order recorded';
  const parts = [
    oxygen.restLpm === null ? null : `${flow(oxygen.restLpm)} at rest`,
    oxygen.walkingLpm === null ? null : `${flow(oxygen.walkingLpm)} when walking`,
    oxygen.asleepLpm === null ? null : `${flow(oxygen.asleepLpm)} asleep`,
  ].filter((part) => part !== null);
  return parts.length === 0 ? 'No flow ordered' : parts.join(', ');
};
