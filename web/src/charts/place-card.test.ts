import { describe, expect, it } from 'vitest';
import { placeCard, type Rect } from './place-card';

describe('placeCard', () => {
  const within = { left: 34, top: 8, width: 858, height: 292 };
  const card = { width: 272, height: 152 };
  const overlaps = (a: Rect, b: Rect) =>
    a.left < b.left + b.width && b.left < a.left + a.width && a.top < b.top + b.height && b.top < a.top + a.height;

  it('lies on the emptier side, over no mark', () => {
    const crowd = [120, 160, 200, 240].map((x) => ({ left: x, top: 150, width: 14, height: 14 }));
    const place = placeCard({ at: { x: 420, y: 150 }, card, within, keepClear: crowd });
    expect(place?.left).toBeGreaterThan(420);
    expect(crowd.some((rect) => place && overlaps({ ...place, ...card }, rect))).toBe(false);
  });

  it('stays in the plot, farther from the point, when both sides of it are taken', () => {
    const both = [390, 450].map((x) => ({ left: x, top: 8, width: 14, height: 292 }));
    const place = placeCard({ at: { x: 420, y: 150 }, card, within, keepClear: both });
    expect(place && place.left >= within.left && place.left + card.width <= within.left + within.width).toBe(true);
    expect(both.some((rect) => place && overlaps({ ...place, ...card }, rect))).toBe(false);
  });

  it('covers the fewest marks where all is taken, and says when the plot is too small for it', () => {
    const wall = Array.from({ length: 40 }, (_, index) => ({ left: 34 + index * 21, top: 8, width: 14, height: 292 }));
    const place = placeCard({ at: { x: 420, y: 150 }, card, within, keepClear: wall });
    expect(place && overlaps({ ...place, ...card }, { left: 413, top: 143, width: 14, height: 14 })).toBe(false);
    expect(place && place.left >= within.left && place.left + card.width <= within.left + within.width).toBe(true);
    expect(placeCard({ at: { x: 60, y: 40 }, card, within: { ...within, width: 260 }, keepClear: [] })).toBeNull();
  });
});
