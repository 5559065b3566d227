import type { TrendBand, TrendSeries } from '@slighthill/shared/contracts/trend';
import { dayNumber } from '@slighthill/shared/calendar';
import { formatDayMonth } from '../lib/clinic-time';
import { formatInView, formatResult } from './format-measure';
import { freestPlace, labelPlace, type LabelPlace, type LabelRoom, type Segment } from './label-room';
import type { LlnLine } from './lln-line';
import type { Rect } from './place-card';
import type { Course } from './time-axis';
import type { DrawnMark, TrendLayout } from './trend-layout';
import { pointInView, type TrendView } from './trend-view';

export interface LatestLabel extends LabelPlace {
  strong: string;
  rest: string;
}

export interface PlotLabels {
  latest: LatestLabel | null;
  lln: LabelPlace | null;
}

export interface LabelRequest {
  series: TrendSeries;
  view: TrendView;
  bands: readonly TrendBand[];
  layout: TrendLayout;
  course: Course | null;
  lln: LlnLine | null;
}

type Spot = { x: number; y: number };

const joined = (spots: readonly Spot[]): Segment[] =>
  spots.slice(1).map((to, index) => {
    const from = spots[index] ?? to;
    return { x1: from.x, y1: from.y, x2: to.x, y2: to.y };
  });

/** The limit's line as it is drawn: carried flat to both edges. */
export const llnPath = ({ frame, x, y }: TrendLayout, line: LlnLine): Spot[] => {
  const at = line.points.map(({ day, value }) => ({ x: x(day), y: y(value) }));
  const [first, last] = [at[0], at.at(-1)];
  return first && last ? [{ x: frame.left, y: first.y }, ...at, { x: frame.right, y: last.y }] : [];
};

/** The room each mark takes, for what must not lie over it. */
export const markBoxes = (marks: readonly DrawnMark[]): Rect[] =>
  marks.map(({ x, y, r }) => ({ left: x - r - 2, top: y - r - 2, width: 2 * r + 4, height: 2 * r + 4 }));

/** Baselines over and under the point, and how far from it its words may begin. */
const aroundPx = { heights: [-14, 25, -30, 41], aside: 60 };

/** Right of the point where there is room, else above, below, on the other side of it, or up to a vertical. */
const latestLabel = (
  { series, view, bands, layout }: LabelRequest,
  verticals: readonly number[],
  room: LabelRoom,
): LatestLabel | null => {
  const shown = layout.marks.find((mark) => mark.point.role === 'latest') ?? layout.marks.at(-1);
  if (!shown) return null;
  const { point, x, y } = shown;
  const strong = formatInView(series.measure, pointInView(point, view) ?? point.value, view, series.unit, bands);
  const raw = view === 'value' ? '' : `${formatResult(series.measure, point.value, series.unit)}, `;
  const rest = layout.narrow ? '' : `${raw}${formatDayMonth(point.takenOn)}`;
  const width = strong.length * 9 + rest.length * 6.8 + 8;
  const beside = [5, -10, 21, -26, 37].map((down) => labelPlace(x + 13, y + down, 'start', width));
  const over = aroundPx.heights.flatMap((down) => [
    labelPlace(x + 4, y + down, 'end', width),
    labelPlace(x - 4, y + down, 'start', width),
  ]);
  const upTo = aroundPx.heights
    .flatMap((down) =>
      verticals.flatMap((at) => [
        labelPlace(at + 6, y + down, 'start', width),
        labelPlace(at - 6, y + down, 'end', width),
      ]),
    )
    .filter(({ box }) => box.left - x < aroundPx.aside && x - box.left - width < aroundPx.aside);
  const place = freestPlace([...beside, ...over, labelPlace(x - 13, y + 5, 'end', width), ...upTo], room);
  return place && { ...place, strong, rest };
};

/** Over its line or under it, at an edge or beside a vertical, where its value holds. */
const llnLabel = (line: LlnLine, layout: TrendLayout, verticals: readonly number[], room: LabelRoom) => {
  const { frame, x } = layout;
  const path = llnPath(layout, line);
  const width = line.label.length * 7;
  const from = line.steady ? frame.left : x(line.points.at(-1)?.day ?? 0);
  const starts = [
    ...(line.steady ? [frame.left + 8] : []),
    frame.right - 8 - width,
    ...verticals.flatMap((at) => [at - 6 - width, at + 8]),
    from + 8,
  ];
  const places = starts
    .filter((left) => left >= from)
    .flatMap((left) => {
      const under = path.filter((spot) => spot.x >= left && spot.x <= left + width).map((spot) => spot.y);
      const level = joined(path).filter(({ x1, x2 }) => x1 <= left + width && x2 >= left);
      const heights = [...under, ...level.flatMap(({ y1, y2 }) => (line.steady ? [y1, y2] : [y2]))];
      if (heights.length === 0) return [];
      return [
        labelPlace(left, Math.min(...heights) - 6, 'start', width),
        labelPlace(left, Math.max(...heights) + 16, 'start', width),
      ];
    });
  const edge = path.at(-1);
  const fallback = edge ? [labelPlace(frame.right - 8, edge.y - 6, 'end', width)] : [];
  return freestPlace([...places, ...fallback], room);
};

/** Where the words inside the plot go: clear of the limit's line, the course's verticals, the marks and each other. */
export const plotLabels = (request: LabelRequest): PlotLabels => {
  const { layout, course, lln } = request;
  const { frame, marks, x } = layout;
  const verticals = [course?.startOn, course?.endOn].flatMap((on) => (on ? [x(dayNumber(on))] : []));
  const room = {
    within: {
      left: frame.left,
      top: frame.top - 2,
      width: frame.right - frame.left,
      height: frame.bottom - frame.top + 2,
    },
    lines: [
      ...verticals.map((at) => ({ x1: at, y1: frame.top, x2: at, y2: frame.bottom })),
      ...(lln ? joined(llnPath(layout, lln)) : []),
      ...joined(layout.line),
    ],
    boxes: markBoxes(marks),
  };
  const latest = latestLabel(request, verticals, room);
  const taken = { ...room, boxes: [...room.boxes, ...(latest ? [latest.box] : [])] };
  return { latest, lln: lln && llnLabel(lln, layout, verticals, taken) };
};
