/** Where a key takes the reader: a point's index, null to put it away, undefined when the key is not the reader's. */
export const readerKey = (key: string, current: number | null, count: number): number | null | undefined => {
  if (count === 0) return undefined;
  const last = count - 1;
  switch (key) {
    case 'ArrowRight':
      return current === null ? 0 : Math.min(last, current + 1);
    case 'ArrowLeft':
      return current === null ? last : Math.max(0, current - 1);
    case 'Home':
      return 0;
    case 'End':
      return last;
    case 'Escape':
      return current === null ? undefined : null;
    default:
      return undefined;
  }
};

/** The mark nearest to a place in the plot; marks of the same date are told apart by height. */
export const nearestMark = (
  marks: readonly { x: number; y: number }[],
  at: { x: number; y: number },
): number | null => {
  let best: number | null = null;
  let bestDistance = Infinity;
  marks.forEach((mark, index) => {
    const distance = Math.abs(mark.x - at.x) * 4 + Math.abs(mark.y - at.y);
    if (distance >= bestDistance) return;
    best = index;
    bestDistance = distance;
  });
  return best;
};
