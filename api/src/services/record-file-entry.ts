import type { FileEntryCreate } from '@slighthill/shared/contracts/file-entry';
import { invalidInput } from '../errors/app-error';
import { FileEntry } from '../models/file-entry';
import { Patient } from '../models/patient';
import { clinicDate } from '../time/clinic-time';
import { checkDate } from './check-instant';
import { runCommand, type CommandContext } from './command-context';
import { createOnce, type Created } from './create-once';
import { refreshDiagnosis } from './refresh-diagnosis';
import { refreshSummaries } from './refresh-summaries';

/** Adds an entry to the record's file. Entries that trends read (diagnosis, exacerbation) refresh the summaries. */
export async function recordFileEntry(
  context: CommandContext,
  patient: Patient,
  body: FileEntryCreate,
): Promise<Created<FileEntry>> {
  checkDate(context, patient, body.on, 'on');
  checkDetails(context, body.kind, body.details, body.on);
  context.audit.showsPatients(patient.id);
  return await runCommand(context, async () => {
    const locked = (await Patient.findByPk(patient.id, { lock: true }))!;
    const created = await createOnce<FileEntry>(context, {
      kind: 'file-entry',
      id: body.id,
      request: { patientId: patient.id, body },
      find: (id) => FileEntry.findByPk(id),
      create: async (id) => {
        const row = await FileEntry.create({
          id,
          clinicId: patient.clinicId,
          patientId: patient.id,
          kind: body.kind,
          onDate: body.on,
          details: body.details,
          note: body.note,
          recordedBy: context.actor.userId,
        });
        await refreshDiagnosis(locked);
        await refreshSummaries(context, locked);
        return row;
      },
    });
    context.audit.about('file-entry', created.row.id);
    return created;
  });
}

/** Checks dates inside the details that the contract cannot, for want of a clock. */
export function checkDetails(context: CommandContext, kind: string, details: object, on: string): void {
  const field = (name: string) => (details as Record<string, unknown>)[name];
  const now = context.clock.now();
  const today = clinicDate(now, context.actor.clinic.timeZone);
  const lastDoseAt = field('lastDoseAt');
  if (typeof lastDoseAt === 'string' && Date.parse(lastDoseAt) > now.getTime() + 5 * 60_000)
    throw invalidInput({ path: 'details.lastDoseAt', message: 'This is in the future' });
  const quitOn = field('quitOn');
  if (typeof quitOn === 'string' && quitOn > today)
    throw invalidInput({ path: 'details.quitOn', message: 'This is in the future' });
  const stoppedOn = field('stoppedOn');
  if (kind === 'medicine' && typeof stoppedOn === 'string' && stoppedOn < on)
    throw invalidInput({ path: 'details.stoppedOn', message: 'This is before the medicine was started' });
}
