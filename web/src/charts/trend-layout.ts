import type { TrendBand, TrendPoint, TrendSeries } from '@slighthill/shared/contracts/trend';
import { dayNumber } from '@slighthill/shared/calendar';
import { scaleLinear } from '@visx/scale';
import { bandStrips, type BandStrip } from './band-strips';
import { dodge } from './dodge';
import { markKind, markRadius, type MarkKind } from './mark-kind';
import { dayDomain, timeTicks, type Course, type TimeTick } from './time-axis';
import { pointInView, type TrendView } from './trend-view';
import { valueDomain } from './value-domain';

export interface Frame {
  width: number;
  height: number;
  left: number;
  top: number;
  right: number;
  bottom: number;
}

export interface DrawnMark {
  point: TrendPoint;
  kind: MarkKind;
  r: number;
  /** Where its date lies. */
  dateX: number;
  /** Where it is drawn. */
  x: number;
  y: number;
}

export interface DrawnStrip extends BandStrip {
  y: number;
  height: number;
}

export interface TrendLayout {
  frame: Frame;
  /** Plots under 480 px wide keep the bands' names only. */
  narrow: boolean;
  x: (day: number) => number;
  y: (value: number) => number;
  ticksY: { value: number; y: number }[];
  ticksX: (TimeTick & { x: number; named: boolean })[];
  strips: DrawnStrip[];
  marks: DrawnMark[];
  /** Comparable points, oldest first: what the line joins. */
  line: { x: number; y: number }[];
  /** Same-day pairs of marks joined by a stem. */
  stems: { x1: number; y1: number; x2: number; y2: number }[];
}

export interface LayoutRequest {
  series: TrendSeries;
  view: TrendView;
  bands: readonly TrendBand[];
  course: Course | null;
  width: number;
}

const axisPx = { left: 34, top: 24, bottom: 32 };
const gutterPx = { wide: 172, narrow: 84 };
const monthNamePx = 30;

const frameOf = (width: number, hasBands: boolean): Frame & { narrow: boolean } => {
  const narrow = width - axisPx.left - gutterPx.wide < 480;
  const gutter = hasBands ? (narrow ? gutterPx.narrow : gutterPx.wide) : narrow ? 8 : 24;
  const height = narrow ? 268 : 312;
  return {
    width,
    height,
    left: axisPx.left,
    top: axisPx.top,
    // A page laid out for paper may measure almost nothing.
    right: Math.max(axisPx.left, width - gutter),
    bottom: height - axisPx.bottom,
    narrow,
  };
};

/** Marks at their dates, moved apart where they touch, with points that have no number in this view left out. */
const placeMarks = (request: LayoutRequest, x: TrendLayout['x'], y: TrendLayout['y']): DrawnMark[] => {
  const marks = request.series.points.flatMap((point): DrawnMark[] => {
    const value = pointInView(point, request.view);
    if (value === null) return [];
    const kind = markKind(point);
    const dateX = x(dayNumber(point.takenOn));
    return [{ point, kind, r: markRadius[kind], dateX, x: dateX, y: y(value) }];
  });
  const shifts = dodge(marks);
  return marks.map((mark, index) => ({ ...mark, x: mark.dateX + (shifts[index] ?? 0) }));
};

const joinPairs = (marks: readonly DrawnMark[]): TrendLayout['stems'] =>
  marks.flatMap((after) => {
    if (after.point.state !== 'after') return [];
    const before = marks.find((mark) => mark.point.state === 'before' && mark.point.takenOn === after.point.takenOn);
    return before ? [{ x1: before.x, y1: before.y, x2: after.x, y2: after.y }] : [];
  });

/** Everything a trend's drawing needs in px, from its data and the room there is. */
export const trendLayout = (request: LayoutRequest): TrendLayout => {
  const { series, view, bands, course, width } = request;
  const { narrow, ...frame } = frameOf(width, bands.length > 0);
  const values = valueDomain(series, view, bands);
  const days = dayDomain(series, course);
  const x = scaleLinear<number>({ domain: [days.from, days.to], range: [frame.left, frame.right] });
  const y = scaleLinear<number>({ domain: [values.from, values.to], range: [frame.bottom, frame.top] });
  const marks = placeMarks(request, x, y);
  return {
    frame,
    narrow,
    x,
    y,
    ticksY: values.ticks.map((value) => ({ value, y: y(value) })),
    ticksX: timeTicks(days, frame.right - frame.left).map((tick) => {
      const at = x(tick.day);
      return { ...tick, x: at, named: at + monthNamePx <= frame.right };
    }),
    strips: bandStrips(series, bands, values).map((strip) => ({
      ...strip,
      y: y(strip.to),
      height: y(strip.from) - y(strip.to),
    })),
    marks,
    line: marks.filter((mark) => mark.point.compared).map((mark) => ({ x: mark.x, y: mark.y })),
    stems: joinPairs(marks),
  };
};
