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

/** Every `stepPx` from one place to another, both included. */
const steps = (from: number, to: number): number[] =>
  to < from ? [] : [...Array.from({ length: Math.floor((to - from) / stepPx) + 1 }, (_, n) => from + n * stepPx), to];

/** Left edges inside the room: beside the point, the emptier side first, then farther and farther from it. */
const leftEdges = ({ at, card, within, keepClear }: CardRequest): number[] => {
  const [nearLeft, nearRight] = [at.x - gapPx - card.width, at.x + gapPx];
  const crowd = (left: number): number => {
    const column: Rect = { left, top: within.top, width: card.width, height: within.height };
    return keepClear.filter((rect) => touches(column, rect)).length;
  };
  const leftward = steps(within.left, nearLeft).sort((a, b) => b - a);
  const rightward = steps(nearRight, within.left + within.width - card.width);
  const beside = [leftward[0], rightward[0]].filter((left) => left !== undefined);
  const farther = [...leftward.slice(1), ...rightward.slice(1)];
  const fromPoint = (left: number): number => (left < at.x ? nearLeft - left : left - nearRight);
  return [...beside.sort((a, b) => crowd(a) - crowd(b)), ...farther.sort((a, b) => fromPoint(a) - fromPoint(b))];
};

/**
 * Beside the point on the emptier side, over no mark; else farther from it, at the top or the bottom; else where it
 * covers the fewest, never the point itself. Null when the room is too small for the card, and it goes below.
 */
export const placeCard = (request: CardRequest): { left: number; top: number } | null => {
  const { card, within, keepClear } = request;
  const tops = steps(within.top, within.top + within.height - card.height);
  let best: { left: number; top: number; covered: number } | null = null;
  for (const left of leftEdges(request)) {
    for (const top of tops) {
      const covered = keepClear.filter((rect) => touches({ left, top, ...card }, rect)).length;
      if (covered < (best?.covered ?? Infinity)) best = { left, top, covered };
      if (covered === 0) return { left, top };
    }
  }
  return best && { left: best.left, top: best.top };
};
