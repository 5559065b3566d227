import { Line, LinePath } from '@visx/shape';
import type { TrendSeries } from '@slighthill/shared/contracts/trend';
import { ChartMark } from './chart-mark';
import { differenceBracket } from './important-difference';
import type { LlnLine } from './lln-line';
import { PlotAxes } from './plot-axes';
import { PlotBands } from './plot-bands';
import { PlotCourse } from './plot-course';
import { PlotDifference } from './plot-difference';
import type { PlotLabels } from './plot-labels';
import { PlotLatest } from './plot-latest';
import { PlotLln } from './plot-lln';
import type { Course } from './time-axis';
import type { DrawnMark, TrendLayout } from './trend-layout';
import type { TrendView } from './trend-view';

interface TrendPlotProps {
  series: TrendSeries;
  view: TrendView;
  course: Course | null;
  layout: TrendLayout;
  lln: LlnLine | null;
  labels: PlotLabels;
  read: DrawnMark | null;
}

/** Ties a mark that was moved aside to its true date. */
const DateStem = ({ mark: { x, y, dateX, r } }: { mark: DrawnMark }) =>
  Math.abs(x - dateX) < 0.5 ? null : (
    <path d={`M${x} ${y}L${dateX} ${y + r + 5}`} stroke="var(--ink)" strokeWidth={1} fill="none" />
  );

export const TrendPlot = ({ series, view, course, layout, lln, labels, read }: TrendPlotProps) => {
  const { frame, marks, line, stems } = layout;
  const bracket = differenceBracket(series, view);
  const baseline = marks.find((mark) => mark.point.role === 'baseline');
  return (
    <svg
      aria-hidden="true"
      viewBox={`0 0 ${frame.width} ${frame.height}`}
      className="block h-auto w-full font-sans"
      preserveAspectRatio="xMinYMin meet"
    >
      <PlotBands layout={layout} measure={series.measure} />
      <PlotAxes layout={layout} />
      {lln && <PlotLln layout={layout} line={lln} label={labels.lln} />}
      {course && <PlotCourse layout={layout} course={course} />}
      {bracket && baseline && <PlotDifference layout={layout} baseline={baseline} bracket={bracket} course={course} />}
      {stems.map((stem) => (
        <line key={`${stem.x1} ${stem.y1}`} {...stem} stroke="var(--ink)" strokeWidth={1.4} />
      ))}
      {line.length > 1 && (
        <LinePath data={line} x={(at) => at.x} y={(at) => at.y} stroke="var(--ink)" strokeWidth={2.2} />
      )}
      {read && (
        <Line
          from={{ x: read.dateX, y: frame.top }}
          to={{ x: read.dateX, y: frame.bottom }}
          stroke="var(--ink)"
          strokeWidth={1}
        />
      )}
      {marks.map((mark) => (
        <g key={`${mark.point.sourceId} ${mark.point.takenAt} ${mark.point.state ?? ''}`} data-mark={mark.kind}>
          <DateStem mark={mark} />
          <ChartMark kind={mark.kind} x={mark.x} y={mark.y} />
        </g>
      ))}
      {read && <circle cx={read.x} cy={read.y} r={9.5} fill="none" stroke="var(--tarn)" strokeWidth={2} />}
      {labels.latest && <PlotLatest label={labels.latest} />}
    </svg>
  );
};
