import type { PatientPatch } from '@slighthill/shared/contracts/patient';
import { wholeYears } from '@slighthill/shared/calendar';
import { searchKey } from '@slighthill/shared/search-key';
import { selectRow } from '../db/query';
import { invalidInput } from '../errors/app-error';
import { Patient } from '../models/patient';
import { runCommand, type CommandContext } from './command-context';
import { checkBirthDate, nameKeys, refuseTakenNumber, writeDiagnosis } from './create-patient';
import { before, given } from './given';
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
    if (changes.birthDate) {
      checkBirthDate(context, changes.birthDate);
      await refuseTestsBefore18(context, patient.id, changes.birthDate);
    }
    if (changes.recordNumber) await refuseTakenNumber(context, changes.recordNumber, patient.id);
    context.audit.keepsBefore(before(patient, changes));
    await patient.update({
      ...changes,
      ...nameKeys(changes.givenName ?? patient.givenName, changes.familyName ?? patient.familyName),
      ...(changes.recordNumber ? { recordKey: searchKey(changes.recordNumber) } : {}),
      version: patient.version + 1,
    });
    if (changes.diagnosisGroup) await writeDiagnosis(context, patient, { diagnosisGroup: changes.diagnosisGroup });
    if (changes.birthDate || changes.sexForPrediction || changes.diagnosisGroup)
      await refreshSummaries(context, patient);
    return patient;
  });
}

/** A corrected birth date must leave every test that stands on or after the 18th birthday. */
async function refuseTestsBefore18(context: CommandContext, patientId: string, birthDate: string): Promise<void> {
  const first = await selectRow<{ on: string | null }>(
    `select min((taken_at at time zone $timeZone)::date)::text as "on" from measurements
     where patient_id = $patientId and voided_at is null`,
    { patientId, timeZone: context.actor.clinic.timeZone },
  );
  if (!first?.on || wholeYears(birthDate, first.on) >= 18) return;
  throw invalidInput({ path: 'birthDate', message: `The patient would have been under 18 at the test of ${first.on}` });
}
