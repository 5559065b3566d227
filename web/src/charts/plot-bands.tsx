import { Line } from '@visx/shape';
import { bandFamily } from './band-strips';
import type { TrendLayout } from './trend-layout';

interface PlotBandsProps {
  layout: TrendLayout;
  measure: string;
}

/** A name in a narrow gutter breaks before its last word. */
const nameLines = (label: string, narrow: boolean): string[] => {
  const cut = label.lastIndexOf(' ');
  return narrow && label.length > 12 && cut > 0 ? [label.slice(0, cut), label.slice(cut + 1)] : [label];
};

/** Strips edge to edge, a contour at each limit; name and limits in words in the gutter, a hairline between. */
export const PlotBands = ({ layout: { frame, strips, narrow }, measure }: PlotBandsProps) => {
  const contour = `var(--band-${bandFamily(measure)}-contour)`;
  const textX = frame.right + (narrow ? 8 : 14);
  return (
    <g>
      {strips.map((strip) => (
        <rect
          key={strip.id}
          data-band={strip.id}
          x={frame.left}
          y={strip.y}
          width={frame.right - frame.left}
          height={strip.height}
          fill={strip.fill ?? 'none'}
        />
      ))}
      {strips.slice(0, -1).map((strip) => (
        <g key={strip.id}>
          <Line from={{ x: frame.left, y: strip.y }} to={{ x: frame.right, y: strip.y }} stroke={contour} />
          <Line from={{ x: frame.right, y: strip.y }} to={{ x: frame.width, y: strip.y }} stroke="var(--line)" />
        </g>
      ))}
      {strips.map((strip) => {
        const lines = nameLines(strip.label, narrow);
        const total = narrow ? lines.length * 14 : 34;
        const top = strip.y + strip.height / 2 - total / 2;
        return (
          <text key={strip.id} x={textX} fill="var(--ink)" fontSize={narrow ? 12 : 13} fontWeight={600}>
            {lines.map((line, index) => (
              <tspan key={line} x={textX} y={top + (narrow ? 11 : 13) + index * 14}>
                {line}
              </tspan>
            ))}
            {!narrow && strip.height >= 30 && (
              <tspan x={textX} y={top + 29} fill="var(--ink-soft)" fontWeight={400}>
                {strip.limits}
              </tspan>
            )}
          </text>
        );
      })}
    </g>
  );
};
