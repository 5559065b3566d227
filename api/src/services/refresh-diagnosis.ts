import type { DiagnosisGroup } from '@slighthill/shared/contracts/patient';
import { requireTransaction } from '../db/in-transaction';
import { FileEntry } from '../models/file-entry';
import type { Patient } from '../models/patient';
import type { CommandContext } from './command-context';

/** The patient's diagnosis group is that of the newest diagnosis entry that stands. */
export async function refreshDiagnosis(_context: CommandContext, patient: Patient): Promise<void> {
  requireTransaction();
  const newest = await FileEntry.findOne({
    where: { patientId: patient.id, kind: 'diagnosis', voidedAt: null },
    order: [
      ['onDate', 'DESC'],
      ['createdAt', 'DESC'],
      ['id', 'DESC'],
    ],
  });
  const group = newest?.details.diagnosisGroup as DiagnosisGroup | undefined;
  if (group && group !== patient.diagnosisGroup)
    await patient.update({ diagnosisGroup: group, version: patient.version + 1 });
}
