import { useId } from 'react';
import type { TrendPoint, TrendSeries } from '@slighthill/shared/contracts/trend';
import { cx } from '../ui/cx';
import { describePoint } from './describe-point';
import { describeTrend } from './describe-trend';
import { differenceBracket } from './important-difference';
import { llnLine } from './lln-line';
import { placeCard } from './place-card';
import { differenceWordsAt } from './plot-difference';
import { markBoxes, plotLabels } from './plot-labels';
import { cardHeightPx, ReaderCard } from './reader-card';
import type { Course } from './time-axis';
import { trendLayout } from './trend-layout';
import { TrendLegend } from './trend-legend';
import { TrendPlot } from './trend-plot';
import { bandsToDraw, type TrendView } from './trend-view';
import { useChartWidth } from './use-chart-width';
import { useReader } from './use-reader';

interface TrendChartProps {
  series: TrendSeries;
  view: TrendView;
  /** Whether the patient's current pattern is abnormal; bands are colored only then. */
  patternAbnormal: boolean;
  course: Course | null;
  onOpenPoint: (point: TrendPoint) => void;
}

const cardWidthPx = 272;

/** One chart for every measure: bands, LLN, marks, line, course, and a reader moved by mouse and keys. */
export const TrendChart = ({ series, view, patternAbnormal, course, onOpenPoint }: TrendChartProps) => {
  const hintId = useId();
  const { parentRef, width } = useChartWidth(1064);
  const bands = bandsToDraw(series, view, patternAbnormal);
  const layout = trendLayout({ series, view, bands, course, width });
  const { frame, marks, narrow } = layout;
  const { read, announces, handlers } = useReader(marks, onOpenPoint);
  const lln = llnLine(series, view);
  const labels = plotLabels({ series, view, bands, layout, course, lln });
  const baseline = marks.find((mark) => mark.point.role === 'baseline');
  const bracket = differenceBracket(series, view);
  const inLegend = baseline && bracket && differenceWordsAt(layout, baseline, bracket, course) === 'legend';
  const described = read && describePoint(series, read.point);
  const place =
    read && described && !narrow
      ? placeCard({
          at: { x: read.dateX, y: read.y },
          card: { width: cardWidthPx, height: cardHeightPx(described) },
          within: {
            left: frame.left,
            top: frame.top - 2,
            width: frame.right - frame.left,
            height: frame.height - frame.top,
          },
          keepClear: [
            ...markBoxes(marks),
            ...[labels.latest, labels.lln].flatMap((label) => (label ? [label.box] : [])),
          ],
        })
      : null;
  const count = marks.length === 1 ? '1 point' : `${marks.length} points`;
  return (
    <figure className="m-0">
      <div
        ref={parentRef}
        role="application"
        tabIndex={0}
        aria-roledescription="trend chart"
        aria-label={describeTrend(series, view)}
        aria-describedby={hintId}
        {...handlers}
        className={cx('relative rounded-cell', read && 'cursor-pointer')}
      >
        <TrendPlot {...{ series, view, course, layout, lln, labels, read }} />
        {described && place && (
          <div data-print="hide" className="pointer-events-none absolute w-68" style={place}>
            <ReaderCard description={described} />
          </div>
        )}
      </div>
      <p role="status" className="sr-only">
        {described && announces ? described.spoken : ''}
      </p>
      <figcaption className="mt-2.5 print:mt-0 flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
        <TrendLegend points={marks.map((mark) => mark.point)} difference={inLegend ? bracket.size : null} />
        <span id={hintId} data-print="hide" className="text-note text-ink-soft">
          {read ? `Point ${marks.indexOf(read) + 1} of ${marks.length}. ` : `${count}. `}
          Arrow keys move the reader, Enter opens the test.
        </span>
      </figcaption>
      {described && !place && (
        <div data-print="hide" className="pointer-events-none relative z-10 h-0">
          <div
            className="absolute top-2 w-68 max-w-full"
            style={{ left: narrow ? 0 : Math.min(read.dateX, frame.right - cardWidthPx) }}
          >
            <ReaderCard description={described} />
          </div>
        </div>
      )}
    </figure>
  );
};
