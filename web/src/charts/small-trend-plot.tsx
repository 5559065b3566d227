import { LinePath } from '@visx/shape';
import type { SmallTrendLayout } from './small-trend-layout';

interface SmallTrendPlotProps {
  layout: SmallTrendLayout;
  width: number;
}

/** More marks than this would hide the line. */
const mostMarks = 12;

/** Zone, dotted baseline, line and marks: shared by the small chart and the one in rows. */
export const SmallTrendPlot = ({ layout: { points, baselineY, zone }, width }: SmallTrendPlotProps) => {
  const last = points.at(-1);
  return (
    <g>
      {zone && <rect data-zone x={0} y={zone.y} width={width} height={zone.height} fill="var(--mist)" />}
      <line
        x1={0}
        x2={width}
        y1={baselineY}
        y2={baselineY}
        stroke="var(--edge)"
        strokeWidth={1.4}
        strokeDasharray="1.5 4"
        strokeLinecap="round"
      />
      {points.length > 1 && (
        <LinePath data={points} x={(at) => at.x} y={(at) => at.y} stroke="var(--ink)" strokeWidth={2} />
      )}
      {(points.length > mostMarks ? points.slice(-1) : points).map((at) => (
        <circle
          key={at.x}
          cx={at.x}
          cy={at.y}
          r={at === last ? 4.4 : 3.4}
          fill="var(--ink)"
          stroke="var(--surface)"
          strokeWidth={1.5}
          paintOrder="stroke"
        />
      ))}
    </g>
  );
};
