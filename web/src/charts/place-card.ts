export interface Rect {
  left: number;
  top: number;
  width: number;
  height: number;
}

export interface CardRequest {
  /** The point the card speaks of. */
  at: { x: number; y: number };
  card: { width: number; height: number };
  /** Where the card may lie. */
  within: Rect;
  /** Marks and labels that must stay visible. */
  keepClear: readonly Rect[];
}

const gapPx = 28;
const clearPx = 4;
const stepPx = 6;

const touches = (a: Rect, b: Rect): boolean =>
  a.left < b.left + b.width + clearPx &&
  b.left < a.left + a.width + clearPx &&
  a.top < b.top + b.height + clearPx &&
  b.top < a.top + a.height + clearPx;

/** Beside the point on the emptier side, over no mark; null when there is no such place, and it goes below. */
export const placeCard = ({ at, card, within, keepClear }: CardRequest): { left: number; top: number } | null => {
  const right = within.left + within.width;
  const sides = [at.x - gapPx - card.width, at.x + gapPx]
    .filter((left) => left >= within.left && left + card.width <= right)
    .map((left) => {
      const column: Rect = { left, top: within.top, width: card.width, height: within.height };
      return { left, crowd: keepClear.filter((rect) => touches(column, rect)).length };
    })
    .sort((a, b) => a.crowd - b.crowd);
  for (const { left } of sides) {
    for (let top = within.top; top + card.height <= within.top + within.height; top += stepPx) {
      if (!keepClear.some((rect) => touches({ left, top, ...card }, rect))) return { left, top };
    }
  }
  return null;
};
