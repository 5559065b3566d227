import type { SpirometryTest } from '@slighthill/shared/contracts/spirometry-test';
import { toLocalInput } from '../../../lib/clinic-time';
import { emptyRow, emptySet, rowCount, type BestRow, type SpirometryForm, type TestSet } from './spirometry-form';

/** A volume as it is usually typed; a third decimal stays where there is one. */
const volume = (liters: number | null): string => {
  if (liters === null) return '';
  return Math.round(liters * 1000) % 10 === 0 ? liters.toFixed(2) : String(liters);
};

const write = (value: number | null): string => (value === null ? '' : String(value));

const bestOf = ({ fev1, fvc, pef, fef2575 }: SpirometryTest['best']): BestRow => ({
  fev1: volume(fev1),
  fvc: volume(fvc),
  pef: write(pef),
  fef2575: write(fef2575),
});

const setOf = (test: SpirometryTest): TestSet => ({
  entry: test.entry,
  rows: Array.from({ length: rowCount }, (_, index) => {
    const maneuver = test.maneuvers[index];
    if (!maneuver) return emptyRow();
    return {
      fev1: volume(maneuver.fev1),
      fvc: volume(maneuver.fvc),
      pef: write(maneuver.pef),
      fef2575: write(maneuver.fef2575),
      time: write(maneuver.forcedTimeS),
      fev1Used: maneuver.fev1Accepted,
      fvcUsed: maneuver.fvcAccepted,
      reason: maneuver.reason ?? '',
    };
  }),
  best: test.entry === 'best' ? bestOf(test.best) : emptySet().best,
});

/** The form as it would have been typed for a test in the record. */
export const formOfTest = (test: SpirometryTest, timeZone: string): SpirometryForm => {
  const after = test.bronchodilator === 'after';
  return {
    ids: { visit: test.visitId, before: test.id, after: test.id },
    performedAt: toLocalInput(test.performedAt, timeZone),
    heightCm: write(test.heightCm),
    heightMethod: test.heightMethod,
    weightKg: write(test.weightKg),
    state: test.bronchodilator,
    drug: test.drug ?? '',
    doseMcg: write(test.doseMcg),
    minutesSinceDose: write(test.minutesSinceDose),
    ownHoursAgo: write(test.ownBronchodilatorHoursAgo),
    before: after ? emptySet() : setOf(test),
    after: after ? setOf(test) : emptySet(),
    withFef: test.maneuvers.some((maneuver) => maneuver.fef2575 !== null),
    note: test.note ?? '',
    answered: [],
    amendReason: '',
  };
};
