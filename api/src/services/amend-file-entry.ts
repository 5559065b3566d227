import { fileDetails, type FileEntryAmendBody } from '@slighthill/shared/contracts/file-entry';
import { z } from 'zod';
import { AppError } from '../errors/app-error';
import { validate } from '../errors/validate';
import { FileEntry } from '../models/file-entry';
import { Patient } from '../models/patient';
import { presentFileEntry } from '../presenters/file-entry';
import { findFileEntry } from '../queries/file-entries';
import { checkDate } from './check-instant';
import { runCommand, type CommandContext } from './command-context';
import { keepRevision, requireChanges } from './keep-revision';
import { lockEntryForChange } from './lock-for-change';
import { checkDetails } from './record-file-entry';
import { refreshDiagnosis } from './refresh-diagnosis';
import { refreshSummaries } from './refresh-summaries';

/** Changes an entry of the file with a reason; the earlier content is kept. */
export async function amendFileEntry(context: CommandContext, id: string, body: FileEntryAmendBody): Promise<void> {
  await runCommand(context, async () => {
    const row = await lockEntryForChange(context, FileEntry, id, body.version);
    if (row.releasedAt !== null)
      throw new AppError('wrong-state', 'This hold was released and is not changed any more.');
    const patient = (await Patient.findByPk(row.patientId, { lock: true }))!;
    context.audit.showsPatients(patient.id);
    context.audit.about('file-entry', row.id);
    const before = presentFileEntry((await findFileEntry(context.actor, id))!);
    const { version: _version, reason, ...changes } = body;
    requireChanges(changes);
    const on = body.on ?? row.onDate;
    const wrapped = z.object({ details: fileDetails[row.kind] });
    const { details } = validate(wrapped, { details: body.details ?? row.details }, 'body');
    checkDate(context, patient, on, 'on');
    checkDetails(context, row.kind, details, on);
    await keepRevision(context, 'file-entry', row, before, reason);
    await row.update({
      onDate: on,
      details: { ...details, ...registrationMark(row) },
      ...(body.note === undefined ? {} : { note: body.note }),
      version: row.version + 1,
    });
    await refreshDiagnosis(patient);
    await refreshSummaries(context, patient);
  });
}

/** An amended registration entry stays one. */
const registrationMark = (row: FileEntry) => (row.details.atRegistration === true ? { atRegistration: true } : {});
