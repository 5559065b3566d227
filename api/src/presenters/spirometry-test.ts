import type { SpirometryTest } from '@slighthill/shared/contracts/spirometry-test';
import type { SpirometryTestRow } from '../queries/spirometry-tests';
import { presentPeople } from './entry-people';

const toL = (ml: number | null) => (ml === null ? null : ml / 1000);

export function presentSpirometryTest(row: SpirometryTestRow): SpirometryTest {
  const { fev1Ml, fvcMl } = row;
  return {
    id: row.id,
    patientId: row.patientId,
    visitId: row.visitId,
    performedAt: row.performedAt.toISOString(),
    performedOn: row.performedOn,
    heightCm: row.heightCm,
    heightMethod: row.heightMethod,
    weightKg: row.weightKg,
    bronchodilator: row.bronchodilator,
    drug: row.drug,
    doseMcg: row.doseMcg,
    minutesSinceDose: row.minutesSinceDose,
    ownBronchodilatorHoursAgo: row.ownBronchodilatorHoursAgo,
    entry: row.entry,
    best: {
      fev1: toL(fev1Ml),
      fvc: toL(fvcMl),
      fev1fvc: fev1Ml === null || fvcMl === null ? null : fev1Ml / fvcMl,
      pef: row.pefLS,
      fef2575: row.fef2575LS,
    },
    maneuvers: row.maneuvers.map((blow) => ({
      fev1: blow.fev1Ml / 1000,
      fvc: blow.fvcMl / 1000,
      pef: blow.pefLS,
      fef2575: blow.fef2575LS,
      forcedTimeS: blow.forcedTimeS,
      fev1Accepted: blow.fev1Accepted,
      fvcAccepted: blow.fvcAccepted,
      reason: blow.reason,
    })),
    quality: row.quality,
    note: row.note,
    ...presentPeople(row),
  };
}
