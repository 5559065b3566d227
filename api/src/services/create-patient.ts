import { wholeYears } from '@slighthill/shared/calendar';
import type { PatientCreate } from '@slighthill/shared/contracts/patient';
import { searchKey } from '@slighthill/shared/search-key';
import { randomUUID } from 'node:crypto';
import { selectRow } from '../db/query';
import { AppError, invalidInput } from '../errors/app-error';
import { FileEntry } from '../models/file-entry';
import { Patient } from '../models/patient';
import { clinicDate } from '../time/clinic-time';
import { runCommand, type CommandContext } from './command-context';
import { createOnce, type Created } from './create-once';

/** Adds a patient of 18 or over, with the first entry of the diagnosis history. */
export async function createPatient(context: CommandContext, body: PatientCreate): Promise<Created<Patient>> {
  checkBirthDate(context, body.birthDate);
  return await runCommand(context, async () => {
    const created = await createOnce<Patient>(context, {
      kind: 'patient',
      id: body.id,
      request: body,
      find: (id) => Patient.findByPk(id),
      create: async (id) => {
        const recordNumber = body.recordNumber ?? (await nextRecordNumber(context.actor.clinicId));
        await refuseTakenNumber(context, recordNumber, id);
        const patient = await Patient.create({
          id,
          clinicId: context.actor.clinicId,
          givenName: body.givenName,
          familyName: body.familyName,
          ...nameKeys(body.givenName, body.familyName),
          birthDate: body.birthDate,
          sexForPrediction: body.sexForPrediction,
          diagnosisGroup: body.diagnosisGroup,
          recordNumber,
          recordKey: searchKey(recordNumber),
          email: body.email,
          phone: body.phone,
          createdBy: context.actor.userId,
        });
        await writeDiagnosis(context, patient, { diagnosisGroup: body.diagnosisGroup, atRegistration: true });
        return patient;
      },
    });
    context.audit.showsPatients(created.row.id);
    context.audit.about('patient', created.row.id);
    return created;
  });
}

export const nameKeys = (givenName: string, familyName: string) => ({
  givenKey: searchKey(givenName),
  familyKey: searchKey(familyName),
});

export function checkBirthDate(context: CommandContext, birthDate: string): void {
  const today = clinicDate(context.clock.now(), context.actor.clinic.timeZone);
  const refuse = (message: string) => invalidInput({ path: 'birthDate', message });
  if (birthDate > today) throw refuse('This is in the future');
  const age = wholeYears(birthDate, today);
  if (age < 18) throw refuse('The patient must be 18 or over');
  if (age > 120) throw refuse('This would make the patient over 120 years old');
}

export async function refuseTakenNumber(
  context: CommandContext,
  recordNumber: string,
  exceptId: string,
): Promise<void> {
  const taken = await Patient.findOne({
    where: { clinicId: context.actor.clinicId, recordKey: searchKey(recordNumber) },
    attributes: ['id'],
  });
  if (!taken || taken.id === exceptId) return;
  throw new AppError('already-exists', 'Another patient has this record number. Nothing was stored.', [
    { path: 'recordNumber', message: 'Another patient has this record number' },
  ]);
}

/** A diagnosis entry that nobody has confirmed yet. */
export async function writeDiagnosis(
  context: CommandContext,
  patient: Patient,
  details: { diagnosisGroup: string; atRegistration?: true },
): Promise<void> {
  await FileEntry.create({
    id: randomUUID(),
    clinicId: patient.clinicId,
    patientId: patient.id,
    kind: 'diagnosis',
    onDate: clinicDate(context.clock.now(), context.actor.clinic.timeZone),
    details: { description: null, confirmedBy: null, ...details },
    note: null,
    recordedBy: context.actor.userId,
  });
}

/** Takes the clinic's next free number; numbers typed by hand are skipped. */
async function nextRecordNumber(clinicId: string): Promise<string> {
  for (;;) {
    const row = await selectRow<{ number: number }>(
      `update clinics set next_record_number = next_record_number + 1 where id = $clinicId
       returning next_record_number - 1 as number`,
      { clinicId },
    );
    const number = String(row!.number);
    if (!(await Patient.findOne({ where: { clinicId, recordKey: number }, attributes: ['id'] }))) return number;
  }
}
