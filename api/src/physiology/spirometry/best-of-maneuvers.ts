export interface ManeuverResult {
  fev1Ml: number;
  fvcMl: number;
  pefLPerS: number | null;
  fef2575LPerS: number | null;
  fev1Accepted: boolean;
  fvcAccepted: boolean;
}

export interface BestOfManeuvers {
  fev1Ml: number | null;
  fvcMl: number | null;
  pefLPerS: number | null;
  fef2575LPerS: number | null;
  /** Positions (from 0) of the maneuvers the values come from. */
  fev1From: number | null;
  fvcFrom: number | null;
  pefFrom: number | null;
  /** The maneuver accepted for both indices with the largest sum; flows come from it. */
  curveFrom: number | null;
}

/** Position of the first maneuver that comes before all others, among those that qualify. */
function first<T>(list: readonly T[], qualifies: (item: T) => boolean, before: (a: T, b: T) => boolean): number | null {
  let best: number | null = null;
  list.forEach((item, index) => {
    if (qualifies(item) && (best === null || before(item, list[best] as T))) best = index;
  });
  return best;
}

const sum = (blow: ManeuverResult): number => blow.fev1Ml + blow.fvcMl;

/**
 * Result of one set of maneuvers, before or after bronchodilator (rule SP-2; Graham 2019, AJRCCM 200:e70, from memory;
 * largest values from different efforts). FEV1 and FVC are each the largest accepted one; FEF25-75 comes from the
 * maneuver accepted for both with the largest sum (tie: larger FVC, then the earlier); PEF is the largest with an
 * accepted FEV1. Whole mL and L/s, any number of maneuvers. An index without an accepted maneuver is null.
 * @example blows of 1210/2560, 1260/2490 and 1190/2610 mL give FEV1 1260, FVC 2610, curve from the third
 */
export function bestOfManeuvers(blows: readonly ManeuverResult[]): BestOfManeuvers {
  const fev1From = first(
    blows,
    (blow) => blow.fev1Accepted,
    (a, b) => a.fev1Ml > b.fev1Ml,
  );
  const fvcFrom = first(
    blows,
    (blow) => blow.fvcAccepted,
    (a, b) => a.fvcMl > b.fvcMl,
  );
  const pefFrom = first(
    blows,
    (blow) => blow.fev1Accepted && blow.pefLPerS !== null,
    (a, b) => (a.pefLPerS ?? 0) > (b.pefLPerS ?? 0),
  );
  const curveFrom = first(
    blows,
    (blow) => blow.fev1Accepted && blow.fvcAccepted,
    (a, b) => sum(a) > sum(b) || (sum(a) === sum(b) && a.fvcMl > b.fvcMl),
  );
  const from = (index: number | null) => (index === null ? null : (blows[index] ?? null));
  return {
    fev1Ml: from(fev1From)?.fev1Ml ?? null,
    fvcMl: from(fvcFrom)?.fvcMl ?? null,
    pefLPerS: from(pefFrom)?.pefLPerS ?? null,
    fef2575LPerS: from(curveFrom)?.fef2575LPerS ?? null,
    fev1From,
    fvcFrom,
    pefFrom,
    curveFrom,
  };
}
