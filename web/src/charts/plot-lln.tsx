import { LinePath } from '@visx/shape';
import type { LabelPlace } from './label-room';
import type { LlnLine } from './lln-line';
import { llnPath } from './plot-labels';
import type { TrendLayout } from './trend-layout';

interface PlotLlnProps {
  layout: TrendLayout;
  line: LlnLine;
  label: LabelPlace | null;
}

/** The lower limit of normal on each day, carried flat to both edges and labeled with its latest value. */
export const PlotLln = ({ layout, line, label }: PlotLlnProps) => (
  <g>
    <LinePath
      data={llnPath(layout, line)}
      x={(point) => point.x}
      y={(point) => point.y}
      stroke="var(--heather)"
      strokeWidth={1.6}
      strokeDasharray="6 5"
    />
    {label && (
      <text
        x={label.x}
        y={label.y}
        textAnchor={label.anchor}
        fontSize={13}
        fill="var(--heather)"
        stroke="var(--paper)"
        strokeWidth={3}
        strokeOpacity={0.8}
        paintOrder="stroke"
      >
        {line.label}
      </text>
    )}
  </g>
);
