import type {
  BestValues,
  Maneuver as ManeuverInput,
  SpirometryTestCreate,
} from '@slighthill/shared/contracts/spirometry-test';
import { requireTransaction } from '../db/in-transaction';
import { Maneuver } from '../models/maneuver';
import type { Patient } from '../models/patient';
import type { SpirometryTest } from '../models/spirometry-test';
import { bestOfManeuvers } from '../physiology/spirometry/best-of-maneuvers';
import type { CommandContext } from './command-context';
import { withDerivedFacts } from './derived-facts';
import { syncMeasurements, type Fact } from './sync-measurements';
import { writeBodySize } from './write-body-size';

const toMl = (volumeL: number) => Math.round(volumeL * 1000);

type TestInput = Omit<SpirometryTestCreate, 'id' | 'visitId'>;

/** The columns of a test; the result is what was entered as best, or derived from the accepted maneuvers. */
export function spirometryColumns(test: TestInput) {
  return {
    performedAt: new Date(test.performedAt),
    heightCm: test.heightCm,
    heightMethod: test.heightMethod,
    weightKg: test.weightKg,
    bronchodilator: test.bronchodilator,
    drug: test.drug,
    doseMcg: test.doseMcg,
    minutesSinceDose: test.minutesSinceDose,
    ownBronchodilatorHoursAgo: test.ownBronchodilatorHoursAgo,
    entry: test.maneuvers ? ('maneuvers' as const) : ('best' as const),
    ...(test.maneuvers ? derivedResult(test.maneuvers) : enteredResult(test.best!)),
    note: test.note,
  };
}

function enteredResult(best: BestValues) {
  return { fev1Ml: toMl(best.fev1), fvcMl: toMl(best.fvc), pefLS: best.pef, fef2575LS: best.fef2575 };
}

function derivedResult(maneuvers: readonly ManeuverInput[]) {
  const best = bestOfManeuvers(
    maneuvers.map((blow) => ({
      fev1Ml: toMl(blow.fev1),
      fvcMl: toMl(blow.fvc),
      pefLPerS: blow.pef,
      fef2575LPerS: blow.fef2575,
      fev1Accepted: blow.fev1Accepted,
      fvcAccepted: blow.fvcAccepted,
    })),
  );
  return { fev1Ml: best.fev1Ml, fvcMl: best.fvcMl, pefLS: best.pefLPerS, fef2575LS: best.fef2575LPerS };
}

/** Writes the maneuvers (when given), the body size and the measurements of a test. */
export async function writeSpirometryFacts(
  context: CommandContext,
  patient: Patient,
  test: SpirometryTest,
  maneuvers: readonly ManeuverInput[] | null,
): Promise<void> {
  requireTransaction();
  if (maneuvers) {
    await Maneuver.destroy({ where: { spirometryTestId: test.id } });
    await Maneuver.bulkCreate(maneuvers.map((blow, index) => maneuverColumns(test, blow, index + 1)));
  }
  const source = {
    kind: 'spirometry-test' as const,
    id: test.id,
    takenAt: test.performedAt,
    heightCm: test.heightCm,
    heightMethod: test.heightMethod,
    weightKg: test.weightKg,
  };
  await writeBodySize(context, patient, source);
  await syncMeasurements(context, patient, source, withDerivedFacts(factsOf(test), test.heightCm));
}

function maneuverColumns(test: SpirometryTest, blow: ManeuverInput, number: number) {
  return {
    spirometryTestId: test.id,
    clinicId: test.clinicId,
    number,
    fev1Ml: toMl(blow.fev1),
    fvcMl: toMl(blow.fvc),
    pefLS: blow.pef,
    fef2575LS: blow.fef2575,
    forcedTimeS: blow.forcedTimeS,
    fev1Accepted: blow.fev1Accepted,
    fvcAccepted: blow.fvcAccepted,
    reason: blow.reason,
  };
}

function factsOf(test: SpirometryTest): Fact[] {
  const index = (measure: 'fev1' | 'fvc' | 'pef' | 'fef2575', value: number | null): Fact[] =>
    value === null ? [] : [{ measure, value, state: test.bronchodilator, quality: test.quality }];
  return [
    ...index('fev1', test.fev1Ml === null ? null : test.fev1Ml / 1000),
    ...index('fvc', test.fvcMl === null ? null : test.fvcMl / 1000),
    ...index('pef', test.pefLS),
    ...index('fef2575', test.fef2575LS),
    ...(test.weightKg === null ? [] : [{ measure: 'weight' as const, value: test.weightKg }]),
  ];
}
