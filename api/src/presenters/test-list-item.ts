import type { TestListItem } from '@slighthill/shared/contracts/measurement';
import { fromStored, isMeasureId } from '@slighthill/shared/measures';
import type { TestRow } from '../queries/list-tests';

export function presentTestListItem(row: TestRow): TestListItem {
  const values: Record<string, number> = {};
  for (const [measure, stored] of Object.entries(row.values))
    if (stored !== null && isMeasureId(measure)) values[measure] = fromStored(measure, stored);
  return {
    kind: row.kind,
    id: row.id,
    at: row.at.toISOString(),
    on: row.on,
    measure: row.measure !== null && isMeasureId(row.measure) ? row.measure : null,
    state: row.state,
    values,
    heightCm: row.heightCm,
    recordedByName: row.recordedByName,
    amended: row.amended,
    voided: row.voided,
  };
}
