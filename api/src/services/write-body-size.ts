import type { HeightMethod } from '@slighthill/shared/contracts/common';
import { randomUUID } from 'node:crypto';
import { requireTransaction } from '../db/in-transaction';
import { BodySize } from '../models/body-size';
import type { Patient } from '../models/patient';
import type { CommandContext } from './command-context';

export interface BodySizeSource {
  kind: 'body-size' | 'spirometry-test' | 'measurement';
  id: string;
  takenAt: Date;
  heightCm: number | null;
  heightMethod: HeightMethod;
  weightKg: number | null;
  note?: string | null;
}

/**
 * Keeps the height and weight that came with an entry, so that later results can carry the height. A source that no
 * longer gives either has its row voided.
 */
export async function writeBodySize(context: CommandContext, patient: Patient, source: BodySizeSource): Promise<void> {
  requireTransaction();
  const existing = await BodySize.findOne({ where: { sourceKind: source.kind, sourceId: source.id } });
  if (source.heightCm === null && source.weightKg === null) {
    if (existing && existing.voidedAt === null)
      await existing.update({
        voidedAt: context.clock.now(),
        voidedBy: context.actor.userId,
        voidReason: 'other',
        voidText: 'No longer part of its source after an amendment',
      });
    return;
  }
  const values = {
    takenAt: source.takenAt,
    heightCm: source.heightCm,
    heightMethod: source.heightCm === null ? null : source.heightMethod,
    weightKg: source.weightKg,
    note: source.note ?? null,
    voidedAt: null,
    voidedBy: null,
    voidReason: null,
    voidText: null,
  };
  if (existing) await existing.update(values);
  else
    await BodySize.create({
      ...values,
      id: source.kind === 'body-size' ? source.id : randomUUID(),
      clinicId: patient.clinicId,
      patientId: patient.id,
      sourceKind: source.kind,
      sourceId: source.id,
      recordedBy: context.actor.userId,
    });
}
