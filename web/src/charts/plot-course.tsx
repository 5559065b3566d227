import { Line } from '@visx/shape';
import { dayNumber } from '@slighthill/shared/calendar';
import { formatDayMonth } from '../lib/clinic-time';
import type { Course } from './time-axis';
import type { TrendLayout } from './trend-layout';

interface PlotCourseProps {
  layout: TrendLayout;
  course: Course;
}

const pxPerLetter = 6.6;

/** Start and end of the course as thin verticals, their words above the plot, and a thick base between them. */
export const PlotCourse = ({ layout: { frame, x, narrow }, course }: PlotCourseProps) => {
  const start = x(dayNumber(course.startOn));
  const end = course.endOn === null ? null : x(dayNumber(course.endOn));
  const startWords = narrow ? 'Enrolled' : `Enrolled ${formatDayMonth(course.startOn)}`;
  const endWords = course.endOn === null ? '' : narrow ? 'End' : `${course.endWord} ${formatDayMonth(course.endOn)}`;
  const [startPx, endPx] = [startWords.length * pxPerLetter, endWords.length * pxPerLetter];
  const apart = end === null || end - start >= startPx + endPx + 20;
  // Words that do not fit between the verticals stand outside, as far as there is room.
  const startLeft = !apart && start - frame.left >= startPx;
  const endRight = end !== null && end - start < endPx + 12;
  return (
    <g stroke="var(--tarn)" fontSize={narrow ? 12 : 13}>
      {[start, ...(end === null ? [] : [end])].map((at) => (
        <Line key={at} from={{ x: at, y: frame.top - 18 }} to={{ x: at, y: frame.bottom }} strokeWidth={1} />
      ))}
      {end !== null && <Line from={{ x: start, y: frame.bottom }} to={{ x: end, y: frame.bottom }} strokeWidth={3} />}
      <g fill="var(--tarn)" stroke="none">
        <text x={startLeft ? start - 6 : start + 6} y={frame.top - 8} textAnchor={startLeft ? 'end' : 'start'}>
          {startWords}
        </text>
        {end !== null && (
          <text x={endRight ? end + 6 : end - 6} y={frame.top - 8} textAnchor={endRight ? 'start' : 'end'}>
            {endWords}
          </text>
        )}
      </g>
    </g>
  );
};
