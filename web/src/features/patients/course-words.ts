import type { PatientListItem } from '@slighthill/shared/contracts/patient';
import { formatDate } from '../../lib/clinic-time';

type Course = NonNullable<PatientListItem['enrollment']>;

const words: Record<Course['status'], string> = {
  planned: 'Starts',
  active: 'Since',
  paused: 'Paused, since',
  completed: 'Completed, from',
  'partly-completed': 'Partly completed, from',
  withdrawn: 'Withdrawn, from',
};

/** One patient's course in a row: "Since Sep 14, 2026". */
export const courseWords = (course: Course | null): string =>
  course ? `${words[course.status]} ${formatDate(course.startOn)}` : 'Not enrolled';
