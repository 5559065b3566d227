import type { Measurement } from '@slighthill/shared/contracts/measurement';
import { fromStored, isMeasureId } from '@slighthill/shared/measures';
import type { MeasurementRow } from '../queries/measurements';
import { presentPeople } from './entry-people';

export function presentMeasurement(row: MeasurementRow): Measurement {
  if (!isMeasureId(row.measure)) throw new Error(`The registry does not know the measure of measurement ${row.id}`);
  return {
    id: row.id,
    patientId: row.patientId,
    measure: row.measure,
    takenAt: row.takenAt.toISOString(),
    takenOn: row.takenOn,
    value: fromStored(row.measure, row.value),
    heightCm: row.heightCm,
    heightMethod: row.heightMethod,
    heightCarried: row.heightCarried,
    weightKg: row.weightKg,
    conditions: row.conditions,
    item9: row.safetyAnswer,
    note: row.note,
    ...presentPeople(row),
  };
}
