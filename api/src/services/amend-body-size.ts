import { bodySizeCreate, type BodySizeAmendBody } from '@slighthill/shared/contracts/measurement';
import { AppError } from '../errors/app-error';
import { validate } from '../errors/validate';
import { BodySize } from '../models/body-size';
import { Patient } from '../models/patient';
import { presentBodySize } from '../presenters/body-size';
import { findBodySize } from '../queries/body-sizes';
import { checkInstant } from './check-instant';
import { bringInLine } from './bring-in-line';
import { runCommand, type CommandContext } from './command-context';
import { keepRevision, requireChanges } from './keep-revision';
import { lockEntryForChange } from './lock-for-change';
import { writeBodySizeFacts } from './record-body-size';

/** Changes a height or weight with a reason. One that came with a test is amended there. */
export async function amendBodySize(context: CommandContext, id: string, body: BodySizeAmendBody): Promise<void> {
  await runCommand(context, async () => {
    const row = await lockEntryForChange(context, BodySize, id, body.version);
    if (row.sourceKind !== 'body-size')
      throw new AppError('wrong-state', 'This height or weight came with a test. Amend the test.');
    const patient = (await Patient.findByPk(row.patientId, { lock: true }))!;
    context.audit.showsPatients(patient.id);
    context.audit.about('body-size', row.id);
    const before = presentBodySize((await findBodySize(context.actor, id))!);
    const { version: _version, reason, ...changes } = body;
    requireChanges(changes);
    const merged = validate(
      bodySizeCreate,
      {
        takenAt: before.takenAt,
        heightCm: before.heightCm,
        heightMethod: before.heightMethod ?? undefined,
        weightKg: before.weightKg,
        note: before.note,
        ...changes,
      },
      'body',
    );
    const takenAt = new Date(merged.takenAt);
    checkInstant(context, patient, takenAt, 'takenAt');
    await keepRevision(context, 'body-size', row, before, reason);
    await writeBodySizeFacts(context, patient, { ...merged, kind: 'body-size', id: row.id, takenAt });
    await BodySize.update({ version: row.version + 1 }, { where: { id: row.id } });
    await bringInLine(context, patient);
  });
}
