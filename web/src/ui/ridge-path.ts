/** Where the hill stands: both feet, the summit, the base line and how wide the whole line is. */
export interface RidgeShape {
  width: number;
  base: number;
  rise: number;
  leftFoot: number;
  center: number;
  rightFoot: number;
}

interface LabelBox {
  left: number;
  right: number;
}

interface RidgeInput {
  width: number;
  base: number;
  rise: number;
  /** Null when no area is current: the line lies flat. */
  label: LabelBox | null;
}

/** The top bar's hill: a long approach 58 before the label, a shorter descent 32 after it, the summit over its center. */
export const ridgeShape = ({ width, base, rise, label }: RidgeInput): RidgeShape => {
  if (!label) {
    const center = width / 2;
    return { width, base, rise: 0, leftFoot: center - 90, center, rightFoot: center + 60 };
  }
  return {
    width,
    base,
    rise,
    leftFoot: label.left - 58,
    center: (label.left + label.right) / 2,
    rightFoot: label.right + 32,
  };
};

/** The phone bar's hill: feet 52 before and 44 after the center of the item. */
export const bottomRidgeShape = ({ width, base, rise, label }: RidgeInput): RidgeShape => {
  const shape = ridgeShape({ width, base, rise, label });
  if (!label) return shape;
  return { ...shape, leftFoot: shape.center - 52, rightFoot: shape.center + 44 };
};

const round = (value: number): number => Math.round(value * 100) / 100;

/**
 * Always the same commands in the same order (M L C C L), so that moving between areas interpolates numbers.
 * Level at both feet and at the summit. A hill that begins left of the edge starts there, on its slope.
 */
export const ridgePath = ({ width, base, rise, leftFoot, center, rightFoot }: RidgeShape): string => {
  const summit = base - rise;
  const approach = center - leftFoot;
  const descent = rightFoot - center;
  const start = Math.min(0, leftFoot);
  const end = Math.max(width, rightFoot);
  const numbers = {
    up: [leftFoot + 0.52 * approach, base, center - 0.44 * approach, summit, center, summit],
    down: [center + 0.4 * descent, summit, rightFoot - 0.56 * descent, base, rightFoot, base],
  };
  const write = (values: number[]): string => values.map(round).join(' ');
  return [
    `M${write([start, base])}`,
    `L${write([leftFoot, base])}`,
    `C${write(numbers.up)}`,
    `C${write(numbers.down)}`,
    `L${write([end, base])}`,
  ].join(' ');
};

/** A shape part of the way between two others; `share` runs from 0 to 1. */
export const betweenRidges = (from: RidgeShape, to: RidgeShape, share: number): RidgeShape => {
  const mix = (a: number, b: number): number => a + (b - a) * share;
  return {
    width: to.width,
    base: to.base,
    rise: mix(from.rise, to.rise),
    leftFoot: mix(from.leftFoot, to.leftFoot),
    center: mix(from.center, to.center),
    rightFoot: mix(from.rightFoot, to.rightFoot),
  };
};

/** The mark: the hill alone in a 40 by 19 box. */
export const markShape: RidgeShape = { width: 38, base: 15.5, rise: 11.5, leftFoot: 5, center: 24, rightFoot: 36 };
