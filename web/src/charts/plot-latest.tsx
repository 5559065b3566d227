import type { TrendBand, TrendSeries } from '@slighthill/shared/contracts/trend';
import { formatDayMonth } from '../lib/clinic-time';
import { formatInView, formatResult } from './format-measure';
import type { Rect } from './place-card';
import type { DrawnMark, TrendLayout } from './trend-layout';
import { pointInView, type TrendView } from './trend-view';

export interface LatestLabel {
  strong: string;
  rest: string;
  x: number;
  y: number;
  anchor: 'start' | 'end';
  box: Rect;
}

/** The latest point's value beside it, right of it where there is room, else above. */
export const latestLabel = (
  series: TrendSeries,
  view: TrendView,
  bands: readonly TrendBand[],
  layout: TrendLayout,
): LatestLabel | null => {
  const shown = layout.marks.find((mark) => mark.point.role === 'latest') ?? layout.marks.at(-1);
  if (!shown) return null;
  const { point } = shown;
  const strong = formatInView(series.measure, pointInView(point, view) ?? point.value, view, series.unit, bands);
  const raw = view === 'value' ? '' : `${formatResult(series.measure, point.value, series.unit)}, `;
  const rest = layout.narrow ? '' : `${raw}${formatDayMonth(point.takenOn)}`;
  const width = strong.length * 9 + rest.length * 6.8 + 8;
  const fits = shown.x + 13 + width <= layout.frame.right;
  const [x, y] = fits ? [shown.x + 13, shown.y + 5] : [shown.x + 4, shown.y - 14];
  const left = fits ? x : x - width;
  return { strong, rest, x, y, anchor: fits ? 'start' : 'end', box: { left, top: y - 14, width, height: 18 } };
};

export const PlotLatest = ({ label }: { label: LatestLabel }) => (
  <text
    x={label.x}
    y={label.y}
    textAnchor={label.anchor}
    fill="var(--ink)"
    fontSize={13}
    // It may lie on a line or an edge, so it gets a rim to stay readable.
    stroke="var(--paper)"
    strokeWidth={3}
    strokeOpacity={0.8}
    paintOrder="stroke"
  >
    <tspan fontSize={15} fontWeight={700}>
      {label.strong}
    </tspan>
    {label.rest && <tspan dx={8}>{label.rest}</tspan>}
  </text>
);

/** The room each mark takes, for what must not lie over it. */
export const markBoxes = (marks: readonly DrawnMark[]): Rect[] =>
  marks.map(({ x, y, r }) => ({ left: x - r - 2, top: y - r - 2, width: 2 * r + 4, height: 2 * r + 4 }));
