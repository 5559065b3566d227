import { describe, expect, it } from 'vitest';
import { betweenRidges, bottomRidgeShape, markShape, ridgePath, ridgeShape } from './ridge-path';

const numbersOf = (path: string): number[] => (path.match(/-?\d+(\.\d+)?/g) ?? []).map(Number);
const commandsOf = (path: string): string => path.replace(/[^A-Z]/g, '');

describe('ridgeShape', () => {
  it('puts the feet 58 before and 32 after the label, the summit over its center', () => {
    const shape = ridgeShape({ width: 1280, base: 61, rise: 15, label: { left: 260, right: 318 } });
    expect(shape).toEqual({ width: 1280, base: 61, rise: 15, leftFoot: 202, center: 289, rightFoot: 350 });
  });

  it('lies flat without a current area', () => {
    const path = ridgePath(ridgeShape({ width: 1280, base: 61, rise: 15, label: null }));
    const heights = numbersOf(path).filter((_, index) => index % 2 === 1);
    expect(new Set(heights)).toEqual(new Set([61]));
  });
});

describe('bottomRidgeShape', () => {
  it('puts the feet 52 before and 44 after the center of the item', () => {
    const shape = bottomRidgeShape({ width: 390, base: 16, rise: 12, label: { left: 0, right: 78 } });
    expect(shape).toMatchObject({ leftFoot: -13, center: 39, rightFoot: 83 });
  });
});

describe('ridgePath', () => {
  it('draws the approach and the descent with the agreed handles', () => {
    const path = ridgePath(ridgeShape({ width: 1280, base: 61, rise: 15, label: { left: 158, right: 242 } }));
    // a = 100 before the summit at 200, b = 74 after it.
    expect(path).toBe('M0 61 L100 61 C152 61 156 46 200 46 C229.6 46 232.56 61 274 61 L1280 61');
  });

  it('starts on the slope, off the edge, when the left foot is outside', () => {
    const path = ridgePath(bottomRidgeShape({ width: 390, base: 16, rise: 12, label: { left: 0, right: 78 } }));
    expect(path.startsWith('M-13 16 L-13 16 C')).toBe(true);
  });

  it('always writes the same commands, so that numbers can be interpolated', () => {
    const flat = ridgeShape({ width: 900, base: 61, rise: 15, label: null });
    const hill = ridgeShape({ width: 900, base: 61, rise: 15, label: { left: 10, right: 60 } });
    for (const shape of [flat, hill, betweenRidges(flat, hill, 0.4), markShape]) {
      expect(commandsOf(ridgePath(shape))).toBe('MLCCL');
      expect(numbersOf(ridgePath(shape))).toHaveLength(18);
    }
  });
});

describe('betweenRidges', () => {
  const from = ridgeShape({ width: 800, base: 61, rise: 15, label: { left: 184, right: 220 } });
  const to = ridgeShape({ width: 800, base: 61, rise: 15, label: { left: 400, right: 480 } });

  it('begins at one shape and ends at the other', () => {
    expect(betweenRidges(from, to, 0)).toEqual(from);
    expect(betweenRidges(from, to, 1)).toEqual(to);
  });

  it('is half way at half', () => {
    expect(betweenRidges(from, to, 0.5).center).toBe((from.center + to.center) / 2);
  });
});
