import { formatZ } from '@slighthill/shared/format';
import { ChartMark } from '../../../charts/chart-mark';
import type { MarkKind } from '../../../charts/mark-kind';

export interface StripPoint {
  z: number;
  kind: MarkKind;
  words: string;
}

interface ZStripProps {
  measure: string;
  points: readonly StripPoint[];
}

const width = 168;
const height = 26;
const [from, to] = [-4.8, 1.6];
/** LLN at the fifth percentile; -2.5 and -4 are the limits of rule GR-4. */
const lln = -1.645;

export const zStripX = (z: number): number =>
  (width * (Math.min(Math.max(z, from + 0.2), to - 0.2) - from)) / (to - from);

/** Where the values lie against the LLN and the z limits; a value off the scale stands at its end. */
export const ZStrip = ({ measure, points }: ZStripProps) => (
  <svg
    role="img"
    aria-label={`${measure}: ${points.map(({ z, words }) => `z ${formatZ(z)} ${words}`).join(', ')}`}
    viewBox={`0 0 ${width} ${height}`}
    width={width}
    height={height}
  >
    <rect x={0} y={0} width={zStripX(lln)} height={height} fill="var(--band-obstructive-3)" />
    <rect x={zStripX(lln)} y={0} width={width - zStripX(lln)} height={height} fill="var(--surface)" />
    {[-4, -2.5].map((z) => (
      <path key={z} d={`M${zStripX(z)} 0V${height}`} stroke="var(--band-obstructive-contour)" strokeWidth={1} />
    ))}
    <path d={`M${zStripX(0)} 0V${height}`} stroke="var(--edge)" strokeWidth={1.2} />
    <path d={`M${zStripX(lln)} 0V${height}`} stroke="var(--heather)" strokeWidth={1.6} strokeDasharray="4 3" />
    {points.length === 2 && (
      <path
        d={`M${zStripX(points[0]!.z)} 8L${zStripX(points[1]!.z)} ${height - 8}`}
        stroke="var(--ink)"
        strokeWidth={1.4}
      />
    )}
    {points.map((point, index) => (
      <ChartMark
        key={point.words}
        kind={point.kind}
        x={zStripX(point.z)}
        y={points.length === 1 ? height / 2 : index === 0 ? 8 : height - 8}
        scale={0.85}
      />
    ))}
  </svg>
);

/** The names above the strips: -4, LLN and 0, each over its line. */
export const ZStripScale = () => (
  <svg aria-hidden="true" viewBox={`0 0 ${width} 14`} width={width} height={14} className="text-head">
    {[
      { z: -4, text: '\u22124', fill: 'var(--ink-soft)' },
      { z: lln, text: 'LLN', fill: 'var(--heather)' },
      { z: 0, text: '0', fill: 'var(--ink-soft)' },
    ].map(({ z, text, fill }) => (
      <text key={text} x={zStripX(z)} y={11} textAnchor="middle" fill={fill}>
        {text}
      </text>
    ))}
  </svg>
);
