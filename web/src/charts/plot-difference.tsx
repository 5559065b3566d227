import type { DifferenceBracket } from './important-difference';
import type { DrawnMark, TrendLayout } from './trend-layout';

interface PlotDifferenceProps {
  layout: TrendLayout;
  baseline: DrawnMark;
  bracket: DifferenceBracket;
}

const besidePx = 16;
const armPx = 6;

/** How much counts, as a bracket left of the baseline. Its words go where they have room. */
export const PlotDifference = ({ layout: { frame, y }, baseline, bracket }: PlotDifferenceProps) => {
  const x = baseline.x - besidePx;
  const [top, bottom] = [y(bracket.to), y(bracket.from)];
  const roomLeft = x - frame.left >= 230;
  return (
    <g>
      <path d={`M${x + armPx} ${top}H${x}V${bottom}H${x + armPx}`} fill="none" stroke="var(--tarn)" strokeWidth={1.6} />
      {roomLeft && (
        <text x={x - 7} y={bottom} fontSize={13} fill="var(--tarn-deep)" textAnchor="end">
          <tspan fontWeight={600}>important difference</tspan> {bracket.size}
        </text>
      )}
    </g>
  );
};
