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
export const courseWords = (course: Course | null): string => {
  if (!course) return 'Not enrolled';
  return dated.includes(course.status) ? `${words[course.status]} ${formatDate(course.startOn)}` : words[course.status];
};
