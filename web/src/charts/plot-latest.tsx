import type { LatestLabel } from './plot-labels';

/** The latest point's value and date. */
export const PlotLatest = ({ label }: { label: LatestLabel }) => (
  <text
    x={label.x}
    y={label.y}
    textAnchor={label.anchor}
    fill="var(--ink)"
    fontSize={13}
    // It may lie on an edge between bands, so it gets a rim to stay readable.
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
