import { withDefaultConditions } from '@slighthill/shared/contracts/conditions';
import { measurementCreate, type MeasurementAmendBody } from '@slighthill/shared/contracts/measurement';
import { AppError } from '../errors/app-error';
import { validate } from '../errors/validate';
import { Measurement } from '../models/measurement';
import { Patient } from '../models/patient';
import { presentMeasurement } from '../presenters/measurement';
import { findMeasurement } from '../queries/measurements';
import { checkInstant } from './check-instant';
import { runCommand, type CommandContext } from './command-context';
import { refreshCombinedMeasures } from './derived-facts';
import { keepRevision } from './keep-revision';
import { lockEntryForChange } from './lock-for-change';
import { refreshCarriedHeights } from './refresh-carried-heights';
import { refreshSummaries } from './refresh-summaries';
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
        conditions: before.conditions,
        item9: before.item9,
        note: before.note,
        ...changes,
      },
      'body',
    );
    const takenAt = new Date(merged.takenAt);
    checkInstant(context, patient, takenAt, 'takenAt');
    await keepRevision(context, 'measurement', row, before, reason);
    const earlierAt = row.takenAt;
    await writeMeasurementFacts(context, patient, {
      ...merged,
      id: row.id,
      takenAt,
      conditions: withDefaultConditions(merged.measure, merged.conditions),
      safetyAnswer: merged.item9,
    });
    if (earlierAt.getTime() !== takenAt.getTime())
      await refreshCombinedMeasures(context, patient, merged.measure, [earlierAt]);
    await Measurement.update({ version: row.version + 1 }, { where: { id: row.id } });
    await refreshCarriedHeights(context, patient);
    await refreshSummaries(context, patient);
  });
}
