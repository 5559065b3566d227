import type { MeasureId } from '@slighthill/shared/measures';

/** Narrows a measure to those a set covers; throws RangeError for another, which is a mistake of the caller. */
export function measureOf<T extends MeasureId>(covered: readonly T[], measure: MeasureId): T {
  const found = covered.find((id) => id === measure);
  if (found === undefined) throw new RangeError(`measure ${measure} is not covered by this set`);
  return found;
}
