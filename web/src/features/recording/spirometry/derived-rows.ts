import type { PredictedMeasure, PredictionResponse } from '@slighthill/shared/contracts/prediction';
import { formatChange, formatNumber, formatPercentPredicted, formatZ, type BandEdge } from '@slighthill/shared/format';
import type { MarkKind } from '../../../charts/mark-kind';
import type { BestPreview } from './best-preview';
import type { StripPoint } from './z-strip';

/** One set as the panel shows it: its best values and, once they are there, the server's predictions. */
export interface DerivedSet {
  title: string;
  kind: MarkKind;
  best: BestPreview;
  prediction: PredictionResponse | null;
}

export interface DerivedRow {
  id: 'fev1' | 'fvc' | 'fev1fvc';
  label: string;
  values: string[];
  change: string;
  /** Never for the ratio, which is no percentage of anything (rule 0.4). */
  percent: string;
  z: string;
  points: StripPoint[];
}

const rows = [
  { id: 'fev1', label: 'FEV1, L' },
  { id: 'fvc', label: 'FVC, L' },
  { id: 'fev1fvc', label: 'FEV1/FVC' },
] as const;

/** A prediction of an older typed value is shown for no other. */
const measureOf = (set: DerivedSet | undefined, id: DerivedRow['id']): PredictedMeasure | null => {
  const found = set?.prediction?.measures[id];
  return found && set.best[id] !== null ? found : null;
};

/** What the panel prints: the numbers of each set, and change, percent predicted and z of the last one that has any. */
export const derivedRows = (sets: readonly DerivedSet[], fev1Edges: readonly BandEdge[]): DerivedRow[] =>
  rows.map(({ id, label }) => {
    const [first, second] = sets;
    const decisive = second && second.best[id] !== null ? second : first;
    const measure = measureOf(decisive, id);
    const [from, to] = [first?.best[id] ?? null, second?.best[id] ?? null];
    const edges = id === 'fev1' ? fev1Edges : [];
    return {
      id,
      label,
      values: sets.map(({ best }) => (best[id] === null ? '' : formatNumber(best[id], 2))),
      change: from !== null && to !== null ? formatChange(to - from, 2) : '',
      percent:
        id !== 'fev1fvc' && measure?.percentPredicted != null
          ? formatPercentPredicted(measure.percentPredicted, edges)
          : '',
      z: measure?.z == null ? '' : formatZ(measure.z),
      points: sets.flatMap((set): StripPoint[] => {
        const z = measureOf(set, id)?.z;
        return z == null ? [] : [{ z, kind: set.kind, words: set.title.toLowerCase() }];
      }),
    };
  });
