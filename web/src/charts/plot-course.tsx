import { Line } from '@visx/shape';
import { dayNumber } from '@slighthill/shared/calendar';
import { formatDayMonth } from '../lib/clinic-time';
import type { Course } from './time-axis';
import type { TrendLayout } from './trend-layout';

interface PlotCourseProps {
  layout: TrendLayout;
  course: Course;
}

/** Start and end of the course as thin verticals with words, and a thick base between them. */
export const PlotCourse = ({ layout: { frame, x, narrow }, course }: PlotCourseProps) => {
  const start = x(dayNumber(course.startOn));
  const end = course.endOn === null ? null : x(dayNumber(course.endOn));
  const startWords = narrow ? 'Enrolled' : `Enrolled ${formatDayMonth(course.startOn)}`;
  const endWords =
    course.endOn === null ? '' : narrow ? course.endWord : `${course.endWord} ${formatDayMonth(course.endOn)}`;
  const together = (startWords.length + endWords.length) * 6.6 + 20;
  const apart = end !== null && end - start >= together;
  return (
    <g stroke="var(--tarn)" fontSize={narrow ? 12 : 13}>
      {[start, ...(end === null ? [] : [end])].map((at) => (
        <Line key={at} from={{ x: at, y: frame.top - 8 }} to={{ x: at, y: frame.bottom }} strokeWidth={1} />
      ))}
      {end !== null && <Line from={{ x: start, y: frame.bottom }} to={{ x: end, y: frame.bottom }} strokeWidth={3} />}
      <g fill="var(--tarn)" stroke="none">
        <text
          x={apart || end === null ? start + 6 : start - 6}
          y={frame.top + 8}
          textAnchor={apart || end === null ? 'start' : 'end'}
        >
          {startWords}
        </text>
        {end !== null && (
          <text x={end - 6} y={frame.top + 8 + (end - start < endWords.length * 6.6 + 12 ? 16 : 0)} textAnchor="end">
            {endWords}
          </text>
        )}
      </g>
    </g>
  );
};
