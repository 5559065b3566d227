import { withDefaultConditions } from '@slighthill/shared/contracts/conditions';
import type { MeasurementCreate } from '@slighthill/shared/contracts/measurement';
import { Measurement } from '../models/measurement';
import { Patient } from '../models/patient';
import { checkInstant } from './check-instant';
import { bringInLine } from './bring-in-line';
import { runCommand, type CommandContext } from './command-context';
import { createOnce, type Created } from './create-once';
import { writeMeasurementFacts } from './write-measurement-facts';

/** Records a measure that is entered as one number, with what it was taken under. */
export async function recordMeasurement(
  context: CommandContext,
  patient: Patient,
  body: MeasurementCreate,
): Promise<Created<Measurement>> {
  checkInstant(context, patient, new Date(body.takenAt), 'takenAt');
  context.audit.showsPatients(patient.id);
  return await runCommand(context, async () => {
    await Patient.findByPk(patient.id, { lock: true, attributes: ['id'] });
    const created = await createOnce<Measurement>(context, {
      kind: 'measurement',
      id: body.id,
      request: { patientId: patient.id, body },
      find: (id) => Measurement.findByPk(id),
      create: async (id) => {
        const row = await writeMeasurementFacts(context, patient, {
          ...body,
          id,
          takenAt: new Date(body.takenAt),
          conditions: withDefaultConditions(body.measure, body.conditions),
          safetyAnswer: body.item9,
        });
        await bringInLine(context, patient, { heights: body.heightCm !== null });
        return row;
      },
    });
    context.audit.about('measurement', created.row.id);
    return created;
  });
}
