import { typed } from '../forms/number-questions';
import type { TestSet } from './spirometry-form';

export interface BestPreview {
  fev1: number | null;
  fvc: number | null;
  fev1fvc: number | null;
  pef: number | null;
  /** Rows whose cells are drawn as the best. */
  fev1Row: number | null;
  fvcRow: number | null;
}

interface Candidate {
  row: number;
  value: number;
}

/** The larger value; of two equal ones the earlier blow. */
const largest = (candidates: readonly Candidate[]): Candidate | null =>
  candidates.reduce<Candidate | null>((best, next) => (best && best.value >= next.value ? best : next), null);

const ratioOf = (fev1: number | null, fvc: number | null): number | null =>
  fev1 !== null && fvc !== null && fvc > 0 && fev1 <= fvc ? fev1 / fvc : null;

/**
 * What a set would report (rule SP-2, Graham 2019, AJRCCM 200:e70; from memory, check before clinical use): the largest
 * FEV1 and the largest FVC that are used, each for itself, and the largest PEF of the blows whose FEV1 is used. A
 * preview: the server decides.
 */
export const bestPreview = (set: TestSet): BestPreview => {
  if (set.entry === 'best') {
    const [fev1, fvc, pef] = [typed(set.best.fev1), typed(set.best.fvc), typed(set.best.pef)];
    return { fev1, fvc, fev1fvc: ratioOf(fev1, fvc), pef, fev1Row: null, fvcRow: null };
  }
  const fev1s: Candidate[] = [];
  const fvcs: Candidate[] = [];
  const pefs: Candidate[] = [];
  set.rows.forEach((blow, row) => {
    const [fev1, fvc, pef] = [typed(blow.fev1), typed(blow.fvc), typed(blow.pef)];
    const impossible = fev1 !== null && fvc !== null && fev1 > fvc;
    if (impossible) return;
    if (fev1 !== null && fev1 > 0 && blow.fev1Used) fev1s.push({ row, value: fev1 });
    if (fvc !== null && fvc > 0 && blow.fvcUsed) fvcs.push({ row, value: fvc });
    if (pef !== null && pef > 0 && blow.fev1Used) pefs.push({ row, value: pef });
  });
  const [fev1, fvc, pef] = [largest(fev1s), largest(fvcs), largest(pefs)];
  return {
    fev1: fev1?.value ?? null,
    fvc: fvc?.value ?? null,
    fev1fvc: ratioOf(fev1?.value ?? null, fvc?.value ?? null),
    pef: pef?.value ?? null,
    fev1Row: fev1?.row ?? null,
    fvcRow: fvc?.row ?? null,
  };
};

/** FEV1/FVC of one row, or null while it cannot be said. */
export const rowRatio = (fev1: string, fvc: string): number | null => ratioOf(typed(fev1), typed(fvc));
