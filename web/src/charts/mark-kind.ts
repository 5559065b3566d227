import type { TrendPoint } from '@slighthill/shared/contracts/trend';

export const markKinds = ['filled', 'open', 'diamond', 'dashed'] as const;
export type MarkKind = (typeof markKinds)[number];

/** Half the width of each mark, in px. */
export const markRadius: Record<MarkKind, number> = { filled: 5, open: 4.4, diamond: 5.6, dashed: 4.4 };

/** The shape says bronchodilator state and quality; a measure without states says whether the point is compared. */
export const markKind = (point: TrendPoint): MarkKind => {
  if (point.quality !== null && !['A', 'B', 'C'].includes(point.quality)) return 'dashed';
  if (point.state === null) return point.compared ? 'filled' : 'open';
  if (point.state === 'after') return 'filled';
  return point.state === 'unknown' ? 'diamond' : 'open';
};

const stateWord = {
  after: 'after bronchodilator',
  before: 'before',
  none: 'none given',
  unknown: 'not stated',
} as const;

export interface LegendEntry {
  kind: MarkKind;
  words: string;
}

/** What the shapes on this chart mean, in the order filled, open, diamond, dashed; only shapes that are drawn. */
export const legendEntries = (points: readonly TrendPoint[]): LegendEntry[] =>
  markKinds.flatMap((kind): LegendEntry[] => {
    const drawn = points.filter((point) => markKind(point) === kind);
    if (drawn.length === 0) return [];
    if (kind === 'dashed') return [{ kind, words: 'quality D or below, not judged' }];
    const states = [...new Set(drawn.map((point) => point.state))];
    if (states.includes(null) && points.every((point) => point.compared)) return [];
    if (states.includes(null)) return [{ kind, words: kind === 'filled' ? 'compared' : 'not compared' }];
    const order = ['after', 'before', 'none', 'unknown'] as const;
    return [
      {
        kind,
        words: order
          .filter((state) => states.includes(state))
          .map((state) => stateWord[state])
          .join(' or '),
      },
    ];
  });
