import type { HeightMethod } from '@slighthill/shared/contracts/common';
import type { SafetyAnswer } from '@slighthill/shared/contracts/measurement';
import type { BronchodilatorState } from '@slighthill/shared/contracts/spirometry-test';
import { getMeasure, toStored, type MeasureId } from '@slighthill/shared/measures';
import { randomUUID } from 'node:crypto';
import { requireTransaction } from '../db/in-transaction';
import { selectRow } from '../db/query';
import { Measurement, type MeasurementSourceKind } from '../models/measurement';
import type { Patient } from '../models/patient';
import { clinicDate } from '../time/clinic-time';
import type { CommandContext } from './command-context';

/** One value a source gives rise to, in the measure's display unit. */
export interface Fact {
  measure: MeasureId;
  value: number;
  state?: BronchodilatorState | null;
  conditions?: Record<string, number | boolean | string>;
  quality?: string | null;
  safetyAnswer?: SafetyAnswer | null;
  note?: string | null;
}

export interface FactSource {
  kind: MeasurementSourceKind;
  id: string;
  takenAt: Date;
  heightCm: number | null;
  heightMethod: HeightMethod | null;
  heightCarried?: boolean;
  weightKg: number | null;
}

/**
 * Brings the measurements of one source in line with what the source now says: writes the new, updates the changed,
 * voids what it no longer gives. A single-value entry is its own source and keeps its id.
 */
export async function syncMeasurements(
  context: CommandContext,
  patient: Patient,
  source: FactSource,
  facts: readonly Fact[],
): Promise<Measurement[]> {
  requireTransaction();
  const existing = await Measurement.findAll({ where: { sourceKind: source.kind, sourceId: source.id } });
  const enrollmentId = await enrollmentOn(context, patient.id, source.takenAt);
  const rows: Measurement[] = [];
  for (const fact of facts) {
    const values = {
      ...columnsOf(source, fact),
      enrollmentId,
      voidedAt: null,
      voidedBy: null,
      voidReason: null,
      voidText: null,
    };
    const row = existing.find((candidate) => candidate.measure === fact.measure);
    if (row) rows.push(await row.update(values));
    else
      rows.push(
        await Measurement.create({
          ...values,
          id: source.kind === 'measurement' && getMeasure(fact.measure).entry === 'single' ? source.id : randomUUID(),
          clinicId: patient.clinicId,
          patientId: patient.id,
          measure: fact.measure,
          sourceKind: source.kind,
          sourceId: source.id,
          recordedBy: context.actor.userId,
        }),
      );
  }
  for (const row of existing)
    if (row.voidedAt === null && !facts.some((fact) => fact.measure === row.measure))
      await row.update({
        voidedAt: context.clock.now(),
        voidedBy: context.actor.userId,
        voidReason: 'other',
        voidText: 'No longer part of its source after an amendment',
      });
  return rows;
}

function columnsOf(source: FactSource, fact: Fact) {
  return {
    takenAt: source.takenAt,
    value: toStored(fact.measure, fact.value),
    state: fact.state ?? null,
    conditions: fact.conditions ?? {},
    quality: fact.quality ?? null,
    safetyAnswer: fact.safetyAnswer ?? null,
    note: fact.note ?? null,
    heightCm: source.heightCm,
    heightMethod: source.heightMethod,
    heightCarried: source.heightCarried ?? false,
    weightKg: source.weightKg,
  };
}

/** The enrollment that was running on the day, with the 28 days after its end in which final tests still count. */
async function enrollmentOn(context: CommandContext, patientId: string, at: Date): Promise<string | null> {
  const row = await selectRow<{ id: string }>(
    `select id from enrollments
     where patient_id = $patientId and clinic_id = $clinicId and start_on <= $on
       and (ended_on is null or ended_on + 28 >= $on)
     order by start_on desc, id desc limit 1`,
    { patientId, clinicId: context.actor.clinicId, on: clinicDate(at, context.actor.clinic.timeZone) },
  );
  return row?.id ?? null;
}
