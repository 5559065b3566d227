import type { BodySizeCreate } from '@slighthill/shared/contracts/measurement';
import { BodySize } from '../models/body-size';
import { Patient } from '../models/patient';
import { carriedHeight } from './carried-height';
import { checkInstant } from './check-instant';
import { bringInLine } from './bring-in-line';
import { runCommand, type CommandContext } from './command-context';
import { createOnce, type Created } from './create-once';
import { withDerivedFacts } from './derived-facts';
import { syncMeasurements } from './sync-measurements';
import { writeBodySize, type BodySizeSource } from './write-body-size';

/** Records a height, a weight or both. */
export async function recordBodySize(
  context: CommandContext,
  patient: Patient,
  body: BodySizeCreate,
): Promise<Created<BodySize>> {
  checkInstant(context, patient, new Date(body.takenAt), 'takenAt');
  context.audit.showsPatients(patient.id);
  return await runCommand(context, async () => {
    await Patient.findByPk(patient.id, { lock: true, attributes: ['id'] });
    const created = await createOnce<BodySize>(context, {
      kind: 'body-size',
      id: body.id,
      request: { patientId: patient.id, body },
      find: (id) => BodySize.findByPk(id),
      create: async (id) => {
        await writeBodySizeFacts(context, patient, { ...body, kind: 'body-size', id, takenAt: new Date(body.takenAt) });
        await bringInLine(context, patient, { heights: body.heightCm !== null });
        return (await BodySize.findByPk(id))!;
      },
    });
    context.audit.about('body-size', created.row.id);
    return created;
  });
}

/** The row, the weight it gives and the BMI that follows with its own or a carried height. */
export async function writeBodySizeFacts(
  context: CommandContext,
  patient: Patient,
  source: BodySizeSource,
): Promise<void> {
  await writeBodySize(context, patient, source);
  const height =
    source.heightCm === null
      ? await carriedHeight(context, patient.id, source.takenAt, source.id)
      : { heightCm: source.heightCm, heightMethod: source.heightMethod, heightCarried: false };
  const facts = source.weightKg === null ? [] : [{ measure: 'weight' as const, value: source.weightKg }];
  await syncMeasurements(
    context,
    patient,
    {
      kind: 'body-size',
      id: source.id,
      takenAt: source.takenAt,
      heightCm: height?.heightCm ?? null,
      heightMethod: height?.heightMethod ?? null,
      heightCarried: height?.heightCarried ?? false,
      weightKg: source.weightKg,
    },
    withDerivedFacts(facts, height?.heightCm ?? null),
  );
}
