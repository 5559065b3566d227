import type { SpirometryTestInput } from '@slighthill/shared/contracts/spirometry-test';
import type { SpirometryEntry } from './steps';
import type { Random } from './random';

export type TestStyle = 'pair' | 'before' | 'after' | 'none' | 'unknown';

export interface SpirometryVisit {
  at: Date;
  style: TestStyle;
  entry: 'maneuvers' | 'best';
  heightCm: number;
  heightMethod?: 'measured' | 'stated';
  weightKg: number | null;
  /** After bronchodilator, in liters. */
  fev1L: number;
  fvcL: number;
  bronchodilatorGain: number;
  note?: string;
}

type BestInput = NonNullable<SpirometryTestInput['best']>;
type ManeuverInput = NonNullable<SpirometryTestInput['maneuvers']>[number];

const minutesAfter = (at: Date, minutes: number) => new Date(at.getTime() + minutes * 60_000).toISOString();
const hundredths = (value: number) => Math.round(value * 100) / 100;

/** The body a spirometry form would send for this visit: one test or a pair, as maneuvers or best values. */
export function spirometryBody(random: Random, visit: SpirometryVisit): SpirometryEntry {
  const common = {
    heightCm: visit.heightCm,
    heightMethod: visit.heightMethod ?? 'measured',
    weightKg: visit.weightKg,
    note: visit.note ?? null,
    visitId: random.uuid(),
  } as const;
  const before = (): SpirometryTestInput => ({
    ...common,
    id: random.uuid(),
    performedAt: visit.at.toISOString(),
    bronchodilator: 'before',
    ownBronchodilatorHoursAgo: random.whole(8, 24),
    ...valuesOf(random, visit, 1 - visit.bronchodilatorGain),
  });
  const after = (): SpirometryTestInput => ({
    ...common,
    id: random.uuid(),
    performedAt: minutesAfter(visit.at, visit.style === 'pair' ? 25 : 0),
    bronchodilator: 'after',
    drug: 'Albuterol',
    doseMcg: 400,
    minutesSinceDose: 15,
    ...valuesOf(random, visit, 1),
  });
  if (visit.style === 'pair') {
    const visitId = random.uuid();
    return {
      tests: [
        { ...before(), visitId },
        { ...after(), visitId },
      ],
    };
  }
  if (visit.style === 'before') return before();
  if (visit.style === 'after') return after();
  return {
    ...common,
    id: random.uuid(),
    performedAt: visit.at.toISOString(),
    bronchodilator: visit.style,
    ...valuesOf(random, visit, 1 - visit.bronchodilatorGain / 2),
  };
}

/** A day's values scatter by a percent or two around what the lungs would give. */
function valuesOf(random: Random, visit: SpirometryVisit, share: number) {
  const fvcShare = 1 - (1 - share) * 0.6;
  const fev1 = hundredths(Math.max(0.4, visit.fev1L * share * random.between(0.985, 1.015)));
  const fvc = hundredths(Math.max(fev1 + 0.05, visit.fvcL * fvcShare * random.between(0.988, 1.012)));
  const best = { fev1, fvc, pef: flow(random, fev1) };
  return visit.entry === 'best' ? { best } : { maneuvers: maneuversOf(random, best) };
}

// Peak flow in L/s runs at about two and a half times the FEV1 in liters; invented for the demo.
const flow = (random: Random, fev1: number) => Math.round(Math.max(1, fev1 * random.between(2.2, 2.7)) * 100) / 100;

function maneuversOf(random: Random, best: BestInput): ManeuverInput[] {
  const bestAt = random.whole(0, 2);
  const blows = Array.from({ length: 3 }, (_, index): ManeuverInput => {
    const share = index === bestAt ? 1 : random.between(0.955, 0.995);
    const fev1 = hundredths(best.fev1 * share);
    const fvc = hundredths(Math.max(fev1, best.fvc * (index === bestAt ? 1 : random.between(0.96, 0.995))));
    return { fev1, fvc, pef: flow(random, fev1), forcedTimeS: Math.round(random.between(6, 13) * 10) / 10 };
  });
  return random.chance(0.2) ? [...blows, rejectedBlow(random, best)] : blows;
}

function rejectedBlow(random: Random, best: BestInput): ManeuverInput {
  const fev1 = hundredths(best.fev1 * random.between(0.7, 0.88));
  return {
    fev1,
    fvc: hundredths(Math.max(fev1, best.fvc * random.between(0.6, 0.85))),
    pef: flow(random, fev1),
    forcedTimeS: Math.round(random.between(1.5, 3.5) * 10) / 10,
    fev1Accepted: false,
    fvcAccepted: false,
    reason: random.pick(['Cough in the first second', 'Stopped early', 'Leak at the mouthpiece']),
  };
}
