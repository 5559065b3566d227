/** Rounding for display only (rule 0.4). Grading and comparing use unrounded values (rule 0.2). */
export const minusSign = '\u2212';

/** Takes off what binary arithmetic adds, before a threshold is compared (rule 0.2). */
export const snap = (value: number): number => Math.round(value * 1e9) / 1e9;

/** Rounds half away from zero on the decimal value, so that 1.005 becomes 1.01 (rule 0.4). */
export function roundHalfAway(value: number, decimals: number): number {
  const rounded = Number(`${Math.round(Number(`${Math.abs(value).toFixed(9)}e${decimals}`))}e${-decimals}`);
  return value < 0 && rounded !== 0 ? -rounded : rounded;
}

/** A number as screens print it, with a real minus sign. */
export function formatNumber(value: number, decimals: number): string {
  const rounded = roundHalfAway(value, decimals);
  const digits = Math.abs(rounded).toFixed(decimals);
  return rounded < 0 ? `${minusSign}${digits}` : digits;
}

/** Like `formatNumber`, with a plus sign on what is above zero, for changes. */
export const formatChange = (value: number, decimals: number): string =>
  `${roundHalfAway(value, decimals) > 0 ? '+' : ''}${formatNumber(value, decimals)}`;

/** Where one band ends and the next begins; `upperIncluded` when the edge itself belongs to the lower band. */
export interface BandEdge {
  at: number;
  upperIncluded?: boolean;
}

const isAbove = (value: number, edge: BandEdge): boolean => (edge.upperIncluded ? value > edge.at : value >= edge.at);

/**
 * Whether a rounded value still tells the truth about an edge: same side, and not printed like an edge that has more
 * decimals than are shown (with the LLN at -1.645, -1.6451 must not read "-1.65", which the LLN itself would).
 */
function isFaithful(value: number, rounded: number, decimals: number, edge: BandEdge): boolean {
  if (isAbove(value, edge) !== isAbove(rounded, edge)) return false;
  const edgeRounded = roundHalfAway(edge.at, decimals);
  return edgeRounded === edge.at || edgeRounded !== rounded;
}

function fewestDecimals(value: number, edges: readonly BandEdge[], from: number, to: number): string {
  const exact = snap(value);
  for (let decimals = from; decimals <= to; decimals += 1) {
    const rounded = roundHalfAway(exact, decimals);
    if (edges.every((edge) => isFaithful(exact, rounded, decimals, edge))) return formatNumber(exact, decimals);
  }
  const crossed = edges.find((edge) => !isFaithful(exact, roundHalfAway(exact, to), to, edge));
  const at = crossed?.at ?? exact;
  const text = at < 0 ? `${minusSign}${Math.abs(at)}` : String(at);
  return `${exact < at ? '<' : '>'}${text}`;
}

/** Percent predicted with the fewest decimals that keep it in its band, e.g. 79.6%, 80%, <60% (rule 0.4). */
export const formatPercentPredicted = (value: number, edges: readonly BandEdge[] = []): string =>
  `${fewestDecimals(value, edges, 0, 2)}%`;

/** The edges of the z bands: LLN, then rule GR-4. */
export const zEdges: readonly BandEdge[] = [{ at: -1.645 }, { at: -2.5 }, { at: -4 }];

/** A z-score with two decimals, up to four where two would put it in another band (rule 0.4). */
export const formatZ = (z: number, edges: readonly BandEdge[] = zEdges): string => fewestDecimals(z, edges, 2, 4);

/** The inner limits of a list of bands, for `formatPercentPredicted` and `formatZ`. */
export function edgesOf(
  bands: readonly { from: number | null; to: number | null; toInclusive?: boolean | undefined }[],
) {
  return bands.flatMap((band): BandEdge[] =>
    band.to === null ? [] : [band.toInclusive ? { at: band.to, upperIncluded: true } : { at: band.to }],
  );
}
