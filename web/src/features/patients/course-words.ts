import type { PatientListItem } from '@slighthill/shared/contracts/patient';
import { formatDate } from '../../lib/clinic-time';

type Course = NonNullable<PatientListItem['enrollment']>;

const words: Record<Course['status'], string> = {
  planned: 'Starts',
  active: 'Since',
  paused: 'Paused',
  completed: 'Completed',
  'partly-completed': 'Partly completed',
  withdrawn: 'Withdrawn',
};

const dated: readonly Course['status'][] = ['planned', 'active'];

/** One patient's course in a row: "Since Sep 14, 2026", "Completed". */
export const courseWords = (course: Course | null, today: string): string => {
  if (!course) return 'Not enrolled';
  if (!dated.includes(course.status)) return words[course.status];
  // A planned start that has passed has not happened.
  const missed = course.status === 'planned' && course.startOn < today;
  return `${missed ? 'Planned,' : words[course.status]} ${formatDate(course.startOn)}`;
};
