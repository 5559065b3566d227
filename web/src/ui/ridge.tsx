import type { RidgeShape } from './ridge-path';
import { ridgePath } from './ridge-path';

interface RidgeProps {
  shape: RidgeShape;
  height: number;
  strokeWidth?: number;
  /** What fills the ground below the line: the page rises under a top bar, the bar itself on a phone. */
  ground: 'paper' | 'mist' | 'none';
}

const grounds = { paper: 'var(--paper)', mist: 'var(--mist)', none: 'none' } as const;

/** The contour line: the border between a bar and its page. Decoration for the eye, silent for a screen reader. */
export const Ridge = ({ shape, height, strokeWidth = 1.75, ground }: RidgeProps) => {
  const path = ridgePath(shape);
  const right = Math.max(shape.width, shape.rightFoot);
  const left = Math.min(0, shape.leftFoot);
  return (
    <svg
      aria-hidden="true"
      data-ridge
      width={shape.width}
      height={height}
      viewBox={`0 0 ${shape.width} ${height}`}
      className="pointer-events-none absolute top-0 left-0"
    >
      {ground !== 'none' && <path d={`${path} L${right} ${height} L${left} ${height} Z`} fill={grounds[ground]} />}
      <path d={path} fill="none" stroke="var(--tarn)" strokeWidth={strokeWidth} />
    </svg>
  );
};
