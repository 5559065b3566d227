import { Line } from '@visx/shape';
import { formatNumber } from '@slighthill/shared/format';
import type { TrendLayout } from './trend-layout';

interface PlotAxesProps {
  layout: TrendLayout;
}

const decimalsOf = (ticks: readonly { value: number }[]): number =>
  Math.max(...ticks.map(({ value }) => String(value).split('.')[1]?.length ?? 0));

/** Numbers without a line at the left, months at the bottom; a grid only where no bands are. */
export const PlotAxes = ({ layout: { frame, ticksX, ticksY, strips } }: PlotAxesProps) => {
  const decimals = decimalsOf(ticksY);
  return (
    <g fontSize={13} fill="var(--ink-soft)">
      {ticksY.map(({ value, y }) => (
        <g key={value}>
          {strips.length === 0 && <Line from={{ x: frame.left, y }} to={{ x: frame.right, y }} stroke="var(--row)" />}
          <text x={frame.left - 8} y={y} dy="0.35em" textAnchor="end">
            {formatNumber(value, decimals)}
          </text>
        </g>
      ))}
      <Line from={{ x: frame.left, y: frame.bottom }} to={{ x: frame.right, y: frame.bottom }} stroke="var(--edge)" />
      {ticksX.map(({ day, x, month, year, named }, index) => {
        const next = ticksX[index + 1];
        const yearBeside = year !== null && (!next || next.x - x >= 70) && x + 64 <= frame.right;
        return (
          <g key={day}>
            <Line from={{ x, y: frame.bottom }} to={{ x, y: frame.bottom + 6 }} stroke="var(--edge)" />
            {named && (
              <text x={x + 4} y={frame.bottom + 17}>
                {month}
                {yearBeside && ` ${year}`}
                {year !== null && !yearBeside && (
                  <tspan x={x + 4} dy={14}>
                    {year}
                  </tspan>
                )}
              </text>
            )}
          </g>
        );
      })}
    </g>
  );
};
