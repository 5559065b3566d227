import type { PatientPatch } from '@slighthill/shared/contracts/patient';
import { searchKey } from '@slighthill/shared/search-key';
import { Patient } from '../models/patient';
import { runCommand, type CommandContext } from './command-context';
import { checkBirthDate, nameKeys, refuseTakenNumber, writeDiagnosis } from './create-patient';
import { given } from './given';
import { lockForChange } from './lock-for-change';
import { refreshSummaries } from './refresh-summaries';

/**
 * Changes a patient's own data. Birth date and sex change every prediction, so the summaries follow; a new diagnosis
 * group becomes an entry of the diagnosis history.
 */
export async function updatePatient(context: CommandContext, id: string, body: PatientPatch): Promise<Patient> {
  return await runCommand(context, async () => {
    const patient = await lockForChange(context, Patient, id, body.version);
    context.audit.showsPatients(patient.id);
    context.audit.about('patient', patient.id);
    const { version: _version, ...fields } = body;
    const changes = given(
      Object.fromEntries(
        Object.entries(fields).filter(([key, value]) => value !== patient.get(key as keyof typeof fields)),
      ) as typeof fields,
    );
    if (Object.keys(changes).length === 0) return patient;
    if (changes.birthDate) checkBirthDate(context, changes.birthDate);
    if (changes.recordNumber) await refuseTakenNumber(context, changes.recordNumber, patient.id);
    await patient.update({
      ...changes,
      ...nameKeys(changes.givenName ?? patient.givenName, changes.familyName ?? patient.familyName),
      ...(changes.recordNumber ? { recordKey: searchKey(changes.recordNumber) } : {}),
      version: patient.version + 1,
    });
    if (changes.diagnosisGroup) await writeDiagnosis(context, patient, changes.diagnosisGroup);
    if (changes.birthDate || changes.sexForPrediction || changes.diagnosisGroup)
      await refreshSummaries(context, patient);
    return patient;
  });
}
