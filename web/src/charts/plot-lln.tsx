import { LinePath } from '@visx/shape';
import type { LlnLine } from './lln-line';
import type { TrendLayout } from './trend-layout';

interface PlotLlnProps {
  layout: TrendLayout;
  line: LlnLine;
}

/** The lower limit of normal on each day, carried flat to both edges and labeled with its latest value. */
export const PlotLln = ({ layout: { frame, x, y }, line }: PlotLlnProps) => {
  const at = line.points.map(({ day, value }) => ({ x: x(day), y: y(value) }));
  const [first, last] = [at[0], at.at(-1)];
  if (!first || !last) return null;
  const path = [{ x: frame.left, y: first.y }, ...at, { x: frame.right, y: last.y }];
  return (
    <g>
      <LinePath
        data={path}
        x={(point) => point.x}
        y={(point) => point.y}
        stroke="var(--heather)"
        strokeWidth={1.6}
        strokeDasharray="6 5"
      />
      <text
        x={line.steady ? frame.left + 8 : frame.right - 8}
        y={(line.steady ? first : last).y - 6}
        textAnchor={line.steady ? 'start' : 'end'}
        fontSize={13}
        fill="var(--heather)"
        stroke="var(--paper)"
        strokeWidth={3}
        strokeOpacity={0.8}
        paintOrder="stroke"
      >
        {line.label}
      </text>
    </g>
  );
};
