export interface Placed {
  x: number;
  y: number;
  r: number;
}

const farthestPx = 6;
const haloPx = 1.5;

/** Sideways shifts, at most 6 px each, that keep marks from touching. In the order given. */
export const dodge = (marks: readonly Placed[]): number[] => {
  const shifts = marks.map(() => 0);
  const order = marks.map((_, index) => index).sort((a, b) => (marks[a]?.x ?? 0) - (marks[b]?.x ?? 0) || a - b);
  const clamp = (shift: number): number => Math.max(-farthestPx, Math.min(farthestPx, shift));
  for (let pass = 0; pass < 3; pass += 1) {
    order.forEach((first, place) => {
      for (const second of order.slice(place + 1)) {
        const [a, b] = [marks[first], marks[second]];
        if (!a || !b || b.x - a.x > 2 * (farthestPx + a.r + b.r)) break;
        const reach = a.r + b.r + haloPx;
        const needed = Math.sqrt(Math.max(0, reach ** 2 - (a.y - b.y) ** 2));
        const missing = needed - (b.x + (shifts[second] ?? 0) - a.x - (shifts[first] ?? 0));
        if (missing <= 0) continue;
        shifts[first] = clamp((shifts[first] ?? 0) - missing / 2);
        shifts[second] = clamp((shifts[second] ?? 0) + missing / 2);
      }
    });
  }
  return shifts;
};
