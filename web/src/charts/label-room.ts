import type { Rect } from './place-card';

export interface Segment {
  x1: number;
  y1: number;
  x2: number;
  y2: number;
}

export interface LabelPlace {
  x: number;
  y: number;
  anchor: 'start' | 'end';
  box: Rect;
}

export interface LabelRoom {
  within: Rect;
  /** Lines that must not run through words. */
  lines: readonly Segment[];
  /** Marks and words that must not be covered. */
  boxes: readonly Rect[];
}

const clearPx = 1;
const fontPx = { rise: 12, height: 16 };

/** A text's place from its baseline. */
export const labelPlace = (x: number, y: number, anchor: LabelPlace['anchor'], width: number): LabelPlace => ({
  x,
  y,
  anchor,
  box: { left: anchor === 'start' ? x : x - width, top: y - fontPx.rise, width, height: fontPx.height },
});

const overlap = (a: Rect, b: Rect): boolean =>
  a.left < b.left + b.width && b.left < a.left + a.width && a.top < b.top + b.height && b.top < a.top + a.height;

/** Whether a line runs through a box: clipped to the box's width, it must lie above or below it. */
export const crosses = ({ x1, y1, x2, y2 }: Segment, { left, top, width, height }: Rect): boolean => {
  const [from, to] = [Math.max(left - clearPx, Math.min(x1, x2)), Math.min(left + width + clearPx, Math.max(x1, x2))];
  if (from > to) return false;
  const yAt = (x: number): number => (x1 === x2 ? y1 : y1 + ((y2 - y1) * (x - x1)) / (x2 - x1));
  const ends = x1 === x2 ? [y1, y2] : [yAt(from), yAt(to)];
  return Math.max(...ends) > top - clearPx && Math.min(...ends) < top + height + clearPx;
};

const inside = (box: Rect, within: Rect): boolean =>
  box.left >= within.left &&
  box.top >= within.top &&
  box.left + box.width <= within.left + within.width &&
  box.top + box.height <= within.top + within.height;

/** The first place where nothing is crossed or covered; where there is none, the one with the least of it. */
export const freestPlace = (places: readonly LabelPlace[], { within, lines, boxes }: LabelRoom): LabelPlace | null => {
  const cost = ({ box }: LabelPlace): number =>
    (inside(box, within) ? 0 : 100) +
    lines.filter((line) => crosses(line, box)).length +
    2 * boxes.filter((other) => overlap(box, other)).length;
  return places.reduce<LabelPlace | null>((best, place) => (best && cost(best) <= cost(place) ? best : place), null);
};
