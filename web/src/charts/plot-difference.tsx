import { dayNumber } from '@slighthill/shared/calendar';
import type { DifferenceBracket } from './important-difference';
import type { Course } from './time-axis';
import type { DrawnMark, TrendLayout } from './trend-layout';

interface PlotDifferenceProps {
  layout: TrendLayout;
  baseline: DrawnMark;
  bracket: DifferenceBracket;
  course: Course | null;
}

const besidePx = 16;
const armPx = 6;
const wordsPx = 230;

/** Where the bracket's words go: left of it, over no mark, else below it, else nowhere, and the legend has them. */
export const differenceWordsAt = (
  { frame, narrow, marks, x: xOf, y: yOf }: TrendLayout,
  baseline: DrawnMark,
  bracket: DifferenceBracket,
  course: Course | null,
): 'left' | 'below' | 'legend' => {
  const x = baseline.x - besidePx;
  const wordsY = yOf(bracket.from);
  const covered = marks.some((mark) => mark.x < x && mark.x > x - wordsPx && Math.abs(mark.y - wordsY) < 16);
  if (x - frame.left >= wordsPx && !covered) return 'left';
  const lines = [course?.startOn, course?.endOn].flatMap((on) => (on ? [xOf(dayNumber(on))] : []));
  const crossed = lines.some((line) => line > x && line < x + wordsPx);
  return !narrow && !crossed && frame.right - x >= wordsPx ? 'below' : 'legend';
};

/** How much counts, as a bracket left of the baseline, with its size in the raw unit. */
export const PlotDifference = ({ layout, baseline, bracket, course }: PlotDifferenceProps) => {
  const x = baseline.x - besidePx;
  const [top, bottom] = [layout.y(bracket.to), layout.y(bracket.from)];
  const place = differenceWordsAt(layout, baseline, bracket, course);
  const left = place === 'left';
  return (
    <g>
      <path d={`M${x + armPx} ${top}H${x}V${bottom}H${x + armPx}`} fill="none" stroke="var(--tarn)" strokeWidth={1.6} />
      {place !== 'legend' && (
        <text
          x={left ? x - 7 : x}
          y={left ? bottom : bottom + 17}
          fontSize={13}
          fill="var(--tarn-deep)"
          textAnchor={left ? 'end' : 'start'}
        >
          <tspan fontWeight={600}>important difference</tspan> {bracket.size}
        </text>
      )}
    </g>
  );
};
