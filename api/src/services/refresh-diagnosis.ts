import type { DiagnosisGroup } from '@slighthill/shared/contracts/patient';
import { requireTransaction } from '../db/in-transaction';
import { selectRow } from '../db/query';
import type { Patient } from '../models/patient';

/**
 * The patient's diagnosis group is that of the newest diagnosis entry that stands; the one made at registration counts
 * only while there is no other.
 */
export async function refreshDiagnosis(patient: Patient): Promise<void> {
  requireTransaction();
  const newest = await selectRow<{ diagnosisGroup: DiagnosisGroup }>(
    `select details ->> 'diagnosisGroup' as "diagnosisGroup" from file_entries
     where patient_id = $patientId and kind = 'diagnosis' and voided_at is null
     order by details ? 'atRegistration', on_date desc, created_at desc, id desc limit 1`,
    { patientId: patient.id },
  );
  if (newest && newest.diagnosisGroup !== patient.diagnosisGroup)
    await patient.update({ diagnosisGroup: newest.diagnosisGroup, version: patient.version + 1 });
}
