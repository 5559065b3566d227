import { edgesOf, formatNumber, type BandEdge } from '@slighthill/shared/format';

/** Limits of the FEV1 bands, for display only: rules GR-3 (Pellegrino 2005), GR-7 (GOLD) and GR-4 (Stanojevic 2022). */
const limits: Readonly<Record<string, readonly number[]>> = {
  'ats-ers-2005': [35, 50, 60, 70],
  gold: [30, 50, 80],
  'ers-ats-2021': [-4, -2.5, -1.645],
};

/** Edges that rounding of a percent predicted must not cross (rule 0.4). */
export const fev1PercentEdges = (rule: string): readonly BandEdge[] =>
  rule === 'ers-ats-2021' ? [] : edgesOf((limits[rule] ?? []).map((to) => ({ from: null, to })));

const words = (limit: number): string => formatNumber(limit, Number.isInteger(limit) ? 0 : limit === -1.645 ? 3 : 1);

/** The limits of the band a value lies in, in words: "60 to under 70", "70 or more", "under 35". */
export const bandLimitWords = (rule: string, value: number): string | null => {
  const edges = limits[rule];
  if (!edges) return null;
  const from = edges.filter((edge) => edge <= value).at(-1);
  const to = edges.find((edge) => edge > value);
  if (from === undefined) return `under ${words(to ?? value)}`;
  return to === undefined ? `${words(from)} or more` : `${words(from)} to under ${words(to)}`;
};
