import { withDefaultConditions } from '@slighthill/shared/contracts/conditions';
import { measurementCreate, type MeasurementAmendBody } from '@slighthill/shared/contracts/measurement';
import { AppError } from '../errors/app-error';
import { validate } from '../errors/validate';
import { Measurement } from '../models/measurement';
import { Patient } from '../models/patient';
import { presentMeasurement } from '../presenters/measurement';
import { findMeasurement } from '../queries/measurements';
import { checkInstant } from './check-instant';
import { bringInLine } from './bring-in-line';
import { runCommand, type CommandContext } from './command-context';
import { keepRevision, requireChanges } from './keep-revision';
import { lockEntryForChange } from './lock-for-change';
import { writeMeasurementFacts } from './write-measurement-facts';

/** Changes a single-value result with a reason; the earlier value is kept. */
export async function amendMeasurement(context: CommandContext, id: string, body: MeasurementAmendBody): Promise<void> {
  await runCommand(context, async () => {
    const row = await lockEntryForChange(context, Measurement, id, body.version);
    if (row.sourceKind !== 'measurement' || row.sourceId !== row.id)
      throw new AppError('wrong-state', 'This result follows from another entry. Amend that one.');
    const patient = (await Patient.findByPk(row.patientId, { lock: true }))!;
    context.audit.showsPatients(patient.id);
    context.audit.about('measurement', row.id);
    const before = presentMeasurement((await findMeasurement(context.actor, id))!);
    const { version: _version, reason, ...changes } = body;
    requireChanges(changes);
    const merged = validate(
      measurementCreate,
      {
        measure: before.measure,
        takenAt: before.takenAt,
        value: before.value,
        // a carried height is looked up again, for the amended instant
        heightCm: before.heightCarried ? null : before.heightCm,
        heightMethod: before.heightMethod ?? undefined,
        weightKg: before.weightKg,
        item9: before.item9,
        note: before.note,
        ...changes,
        // a condition that is not named keeps its value
        conditions: { ...before.conditions, ...changes.conditions },
      },
      'body',
    );
    const takenAt = new Date(merged.takenAt);
    checkInstant(context, patient, takenAt, 'takenAt');
    await keepRevision(context, 'measurement', row, before, reason);
    await writeMeasurementFacts(context, patient, {
      ...merged,
      id: row.id,
      takenAt,
      conditions: withDefaultConditions(merged.measure, merged.conditions),
      safetyAnswer: merged.item9,
    });
    await Measurement.update({ version: row.version + 1 }, { where: { id: row.id } });
    await bringInLine(context, patient);
  });
}
