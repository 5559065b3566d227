import { selectRow } from '../db/query';
import type { HeightMethod } from '@slighthill/shared/contracts/common';

export interface Height {
  heightCm: number;
  heightMethod: HeightMethod;
  heightCarried: boolean;
}

/**
 * The newest measured height up to the instant and at most 12 months old, or null. A result recorded without a height
 * uses it, marked as carried.
 */
export async function carriedHeight(patientId: string, at: Date, exceptSourceId?: string): Promise<Height | null> {
  const row = await selectRow<{ heightCm: number; heightMethod: HeightMethod }>(
    `select height_cm::float8 as "heightCm", height_method as "heightMethod"
     from body_sizes
     where patient_id = $patientId and voided_at is null and height_cm is not null and height_method = 'measured'
       and taken_at <= $at and taken_at >= $at::timestamptz - interval '12 months'
       and source_id is distinct from $exceptSourceId
     order by taken_at desc, id desc limit 1`,
    { patientId, at, exceptSourceId },
  );
  return row ? { ...row, heightCarried: true } : null;
}
