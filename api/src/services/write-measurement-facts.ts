import type { HeightMethod } from '@slighthill/shared/contracts/common';
import type { SafetyAnswer } from '@slighthill/shared/contracts/measurement';
import type { MeasureId } from '@slighthill/shared/measures';
import { requireTransaction } from '../db/in-transaction';
import type { Measurement } from '../models/measurement';
import type { Patient } from '../models/patient';
import { carriedHeight } from './carried-height';
import type { CommandContext } from './command-context';
import { withDerivedFacts } from './derived-facts';
import { refreshFlagsOf } from './raise-flags';
import { syncMeasurements } from './sync-measurements';
import { writeBodySize } from './write-body-size';

export interface MeasurementFacts {
  id: string;
  measure: MeasureId;
  takenAt: Date;
  value: number;
  heightCm: number | null;
  heightMethod: HeightMethod;
  weightKg: number | null;
  conditions: Record<string, number | boolean | string>;
  safetyAnswer: SafetyAnswer | null;
  note: string | null;
}

/**
 * Writes a single-value result and all that follows from it: the height it carries, BMI, flags.
 * A missing height is the newest measured one of the last 12 months, marked as carried.
 */
export async function writeMeasurementFacts(
  context: CommandContext,
  patient: Patient,
  facts: MeasurementFacts,
): Promise<Measurement> {
  requireTransaction();
  const { id, takenAt } = facts;
  const isWeight = facts.measure === 'weight';
  const weightKg = isWeight ? facts.value : facts.weightKg;
  await writeBodySize(context, patient, {
    kind: 'measurement',
    id,
    takenAt,
    heightCm: facts.heightCm,
    heightMethod: facts.heightMethod,
    weightKg,
  });
  const height =
    facts.heightCm === null
      ? await carriedHeight(context, patient.id, takenAt, id)
      : { heightCm: facts.heightCm, heightMethod: facts.heightMethod, heightCarried: false };
  const source = {
    kind: 'measurement' as const,
    id,
    takenAt,
    heightCm: height?.heightCm ?? null,
    heightMethod: height?.heightMethod ?? null,
    heightCarried: height?.heightCarried ?? false,
    weightKg,
  };
  const own = {
    measure: facts.measure,
    value: facts.value,
    conditions: facts.conditions,
    safetyAnswer: facts.safetyAnswer,
    note: facts.note,
  };
  const [row] = await syncMeasurements(context, patient, source, withDerivedFacts([own], source.heightCm));
  await refreshFlagsOf(context, row!);
  return row!;
}
