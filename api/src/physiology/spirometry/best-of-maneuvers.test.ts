import { describe, expect, it } from 'vitest';
import { bestOfManeuvers, type ManeuverResult } from './best-of-maneuvers';

const blow = (
  fev1Ml: number,
  fvcMl: number,
  accepted: 'A' | 'fev1' | 'fvc' | 'X',
  fef2575LPerS: number | null = null,
) =>
  ({
    fev1Ml,
    fvcMl,
    pefLPerS: null,
    fef2575LPerS,
    fev1Accepted: accepted === 'A' || accepted === 'fev1',
    fvcAccepted: accepted === 'A' || accepted === 'fvc',
  }) satisfies ManeuverResult;

describe('best of maneuvers (rule SP-2; Graham 2019)', () => {
  it('takes the largest accepted values from different blows', () => {
    const best = bestOfManeuvers([blow(1210, 2560, 'A', 0.5), blow(1260, 2490, 'A', 0.6), blow(1190, 2610, 'A', 0.7)]);
    expect(best).toMatchObject({ fev1Ml: 1260, fev1From: 1, fvcMl: 2610, fvcFrom: 2, curveFrom: 2, fef2575LPerS: 0.7 });
    expect((best.fev1Ml ?? 0) / (best.fvcMl ?? 1)).toBeCloseTo(0.4828, 4);
  });

  it('leaves out an index that was not accepted', () => {
    const best = bestOfManeuvers([blow(900, 1800, 'A'), blow(960, 1740, 'fev1'), blow(870, 1900, 'X')]);
    expect(best).toMatchObject({ fev1Ml: 960, fev1From: 1, fvcMl: 1800, fvcFrom: 0, curveFrom: 0 });
  });

  it('has no result without an accepted maneuver', () => {
    const best = bestOfManeuvers([blow(1500, 2700, 'X', 1), blow(1450, 2750, 'X', 1)]);
    expect(best).toMatchObject({ fev1Ml: null, fvcMl: null, fef2575LPerS: null, curveFrom: null });
    expect(bestOfManeuvers([]).fev1Ml).toBeNull();
  });

  it('breaks a tie of sums by FVC, then by the earlier blow', () => {
    const tied = bestOfManeuvers([blow(1800, 2400, 'A'), blow(1800, 2380, 'A'), blow(1740, 2400, 'A')]);
    expect(tied).toMatchObject({ fev1Ml: 1800, fev1From: 0, fvcMl: 2400, fvcFrom: 0, curveFrom: 0 });
    expect(bestOfManeuvers([blow(1800, 2400, 'A'), blow(1750, 2450, 'A')]).curveFrom).toBe(1);
  });

  it('takes the largest PEF among blows with an accepted FEV1', () => {
    const blows = [
      { ...blow(1000, 2000, 'A'), pefLPerS: 3.1 },
      { ...blow(1000, 2000, 'fvc'), pefLPerS: 4.2 },
      { ...blow(900, 2000, 'fev1'), pefLPerS: 3.6 },
    ];
    expect(bestOfManeuvers(blows)).toMatchObject({ pefLPerS: 3.6, pefFrom: 2 });
  });
});
