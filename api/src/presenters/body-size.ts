import type { BodySize } from '@slighthill/shared/contracts/measurement';
import type { BodySizeRow } from '../queries/body-sizes';
import { presentPeople } from './entry-people';

export function presentBodySize(row: BodySizeRow): BodySize {
  return {
    id: row.id,
    patientId: row.patientId,
    takenAt: row.takenAt.toISOString(),
    takenOn: row.takenOn,
    heightCm: row.heightCm,
    heightMethod: row.heightMethod,
    weightKg: row.weightKg,
    bmi: row.bmi,
    note: row.note,
    ...presentPeople(row),
  };
}
