import { localPoint } from '@visx/event';
import { useId, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import type { TrendPoint, TrendSeries } from '@slighthill/shared/contracts/trend';
import { cx } from '../ui/cx';
import { describePoint } from './describe-point';
import { describeTrend } from './describe-trend';
import { differenceBracket } from './important-difference';
import { placeCard } from './place-card';
import { differenceWordsAt } from './plot-difference';
import { latestLabel, markBoxes } from './plot-latest';
import { cardHeightPx, ReaderCard } from './reader-card';
import { nearestMark, readerKey } from './reader-keys';
import type { Course } from './time-axis';
import { trendLayout } from './trend-layout';
import { TrendLegend } from './trend-legend';
import { TrendPlot } from './trend-plot';
import { bandsToDraw, type TrendView } from './trend-view';
import { useChartWidth } from './use-chart-width';

interface TrendChartProps {
  series: TrendSeries;
  view: TrendView;
  /** Whether the patient's current pattern is abnormal; bands are colored only then. */
  patternAbnormal: boolean;
  course: Course | null;
  onOpenPoint: (point: TrendPoint) => void;
}

const cardWidthPx = 272;

export const TrendChart = ({ series, view, patternAbnormal, course, onOpenPoint }: TrendChartProps) => {
  const hintId = useId();
  const { parentRef, width } = useChartWidth(1064);
  const [index, setIndex] = useState<number | null>(null);
  const [byKey, setByKey] = useState(false);
  const pointerKind = useRef('');
  const bands = bandsToDraw(series, view, patternAbnormal);
  const layout = trendLayout({ series, view, bands, course, width });
  const { frame, marks, narrow } = layout;
  const read = index === null ? null : (marks[Math.min(index, marks.length - 1)] ?? null);
  const label = latestLabel(series, view, bands, layout);
  const baseline = marks.find((mark) => mark.point.role === 'baseline');
  const bracket = differenceBracket(series, view);
  const inLegend = baseline && bracket && differenceWordsAt(layout, baseline, bracket, course) === 'legend';
  const difference = inLegend ? bracket.size : null;
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
          keepClear: [...markBoxes(marks), ...(label ? [label.box] : [])],
        })
      : null;

  const onKeyDown = (event: KeyboardEvent): void => {
    if (event.key === 'Enter' && read) {
      event.preventDefault();
      onOpenPoint(read.point);
      return;
    }
    const next = readerKey(event.key, index, marks.length);
    if (next === undefined) return;
    event.preventDefault();
    setByKey(true);
    setIndex(next);
  };

  const onPointer = (event: PointerEvent<HTMLDivElement>): void => {
    const at = localPoint(event.currentTarget, event);
    if (!at) return;
    pointerKind.current = event.pointerType;
    setByKey(false);
    setIndex(nearestMark(marks, at));
  };

  return (
    <figure className="m-0">
      <div
        ref={parentRef}
        role="application"
        tabIndex={0}
        aria-roledescription="trend chart"
        aria-label={describeTrend(series, view)}
        aria-describedby={hintId}
        onKeyDown={onKeyDown}
        onPointerMove={onPointer}
        onPointerDown={onPointer}
        onPointerLeave={(event) => event.pointerType === 'mouse' && setIndex(null)}
        onBlur={() => setIndex(null)}
        // A finger reads first: only a mouse opens the test it points at.
        onClick={() => read && pointerKind.current === 'mouse' && onOpenPoint(read.point)}
        className={cx('relative rounded-cell', read && 'cursor-pointer')}
      >
        <TrendPlot {...{ series, view, course, layout, label, read }} />
        {described && place && (
          <div
            data-print="hide"
            className="pointer-events-none absolute w-68"
            style={{ left: place.left, top: place.top }}
          >
            <ReaderCard description={described} />
          </div>
        )}
      </div>
      {described && !place && (
        <div data-print="hide" className="mt-2 max-w-104">
          <ReaderCard description={described} />
        </div>
      )}
      <p role="status" className="sr-only">
        {described && byKey ? described.spoken : ''}
      </p>
      <figcaption className="mt-2.5 flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
        <TrendLegend points={marks.map((mark) => mark.point)} difference={difference} />
        <span id={hintId} data-print="hide" className="text-note text-ink-soft">
          {index === null || !read
            ? `${marks.length === 1 ? '1 point' : `${marks.length} points`}. `
            : `Point ${marks.indexOf(read) + 1} of ${marks.length}. `}
          Arrow keys move the reader, Enter opens the test.
        </span>
      </figcaption>
    </figure>
  );
};
