import { markRadius, type MarkKind } from './mark-kind';

interface ChartMarkProps {
  kind: MarkKind;
  x: number;
  y: number;
  scale?: number;
}

/** One point: filled after bronchodilator, open before, diamond not stated, dashed for low quality. */
export const ChartMark = ({ kind, x, y, scale = 1 }: ChartMarkProps) => {
  const r = markRadius[kind] * scale;
  if (kind === 'filled')
    return (
      <circle cx={x} cy={y} r={r} fill="var(--ink)" stroke="var(--surface)" strokeWidth={1.5} paintOrder="stroke" />
    );
  const open = { fill: 'var(--surface)', stroke: 'var(--ink)', strokeWidth: 1.8 };
  if (kind === 'diamond')
    return <path d={`M${x} ${y - r}L${x + r} ${y}L${x} ${y + r}L${x - r} ${y}Z`} {...open} strokeLinejoin="round" />;
  return <circle cx={x} cy={y} r={r} {...open} {...(kind === 'dashed' ? { strokeDasharray: '2.2 2' } : {})} />;
};
