import { fromStored, isMeasureId, type MeasureId } from '@slighthill/shared/measures';
import { Op } from 'sequelize';
import { requireTransaction } from '../db/in-transaction';
import { Measurement } from '../models/measurement';
import type { Patient } from '../models/patient';
import { carriedHeightsOf } from './carried-height';
import type { CommandContext } from './command-context';
import { withDerivedFacts } from './derived-facts';
import { syncMeasurements, type Fact } from './sync-measurements';

/**
 * Results recorded without a height carry the newest measured one. When a height is amended, voided or entered late,
 * those results are brought in line, with what was worked out from the height.
 */
export async function refreshCarriedHeights(context: CommandContext, patient: Patient): Promise<void> {
  requireTransaction();
  const rows = await Measurement.findAll({
    where: {
      patientId: patient.id,
      voidedAt: null,
      sourceKind: ['measurement', 'body-size'],
      [Op.or]: [{ heightCarried: true }, { heightCm: null }],
    },
    order: ['takenAt', 'id'],
  });
  const bySource = new Map<string, Measurement[]>();
  for (const row of rows) bySource.set(row.sourceId, [...(bySource.get(row.sourceId) ?? []), row]);
  if (bySource.size === 0) return;
  const heights = await carriedHeightsOf(context, patient.id);
  for (const [sourceId, group] of bySource) {
    const first = group[0]!;
    const height = heights.get(sourceId) ?? null;
    if ((height?.heightCm ?? null) === first.heightCm) continue;
    const source = {
      kind: first.sourceKind,
      id: sourceId,
      takenAt: first.takenAt,
      heightCm: height?.heightCm ?? null,
      heightMethod: height?.heightMethod ?? null,
      heightCarried: height !== null,
      weightKg: first.weightKg,
    };
    await syncMeasurements(context, patient, source, withDerivedFacts(group.flatMap(ownFact), source.heightCm));
  }
}

/** The fact a row was written from; rows that only follow from others are worked out again. */
function ownFact(row: Measurement): Fact[] {
  if (!isMeasureId(row.measure)) return [];
  const measure: MeasureId = row.measure;
  const isOwn = row.sourceKind === 'measurement' ? row.id === row.sourceId : measure === 'weight';
  if (!isOwn) return [];
  return [
    {
      measure,
      value: fromStored(measure, row.value),
      state: row.state,
      conditions: row.conditions,
      quality: row.quality,
      safetyAnswer: row.safetyAnswer,
      note: row.note,
    },
  ];
}
