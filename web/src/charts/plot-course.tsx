import { Line } from '@visx/shape';
import { dayNumber } from '@slighthill/shared/calendar';
import { courseLabels } from './course-labels';
import type { Course } from './time-axis';
import type { TrendLayout } from './trend-layout';

interface PlotCourseProps {
  layout: TrendLayout;
  course: Course;
}

/** Start and end of the course as thin verticals, their words above the plot, and a thick base between them. */
export const PlotCourse = ({ layout: { frame, x, narrow }, course }: PlotCourseProps) => {
  const start = x(dayNumber(course.startOn));
  const end = course.endOn === null ? null : x(dayNumber(course.endOn));
  return (
    <g stroke="var(--tarn)" fontSize={narrow ? 12 : 13}>
      {[start, ...(end === null ? [] : [end])].map((at) => (
        <Line key={at} from={{ x: at, y: frame.top - 18 }} to={{ x: at, y: frame.bottom }} strokeWidth={1} />
      ))}
      {end !== null && <Line from={{ x: start, y: frame.bottom }} to={{ x: end, y: frame.bottom }} strokeWidth={3} />}
      {courseLabels(course, { start, end, left: frame.left, width: frame.width, narrow }).map((label) => (
        <text
          key={label.words}
          x={label.x}
          y={frame.top - 8}
          textAnchor={label.anchor}
          fill="var(--tarn)"
          stroke="none"
        >
          {label.words}
        </text>
      ))}
    </g>
  );
};
