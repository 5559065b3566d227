import { formatDayMonth } from '../lib/clinic-time';
import type { Course } from './time-axis';

export interface CourseLabel {
  x: number;
  words: string;
  anchor: 'start' | 'end';
}

interface CourseRoom {
  start: number;
  end: number | null;
  left: number;
  width: number;
  narrow: boolean;
}

const pxPerLetter = 6.6;
const gapPx = 6;

/** Words for the two verticals: between them where they fit, else outside, else one phrase left of both. */
export const courseLabels = (course: Course, { start, end, left, width, narrow }: CourseRoom): CourseLabel[] => {
  const first = narrow ? 'Enrolled' : `Enrolled ${formatDayMonth(course.startOn)}`;
  if (end === null || course.endOn === null) return [{ x: start + gapPx, words: first, anchor: 'start' }];
  const last = narrow ? 'End' : `${course.endWord} ${formatDayMonth(course.endOn)}`;
  const [firstPx, lastPx] = [first.length * pxPerLetter, last.length * pxPerLetter];
  const lastInside = end - start >= lastPx + 2 * gapPx;
  if (!lastInside && end + gapPx + lastPx > width) {
    const words = `${first}, ${last.charAt(0).toLowerCase()}${last.slice(1)}`;
    return [{ x: start - gapPx, words, anchor: 'end' }];
  }
  const bothInside = end - start >= firstPx + lastPx + 20;
  const firstLeft = !bothInside && start - left >= firstPx;
  return [
    { x: firstLeft ? start - gapPx : start + gapPx, words: first, anchor: firstLeft ? 'end' : 'start' },
    { x: lastInside ? end - gapPx : end + gapPx, words: last, anchor: lastInside ? 'end' : 'start' },
  ];
};
