import type { SpirometryPairCreate, SpirometryTestCreate } from '@slighthill/shared/contracts/spirometry-test';
import { randomUUID } from 'node:crypto';
import { Op } from 'sequelize';
import { invalidInput } from '../errors/app-error';
import { Patient } from '../models/patient';
import { SpirometryTest } from '../models/spirometry-test';
import { checkInstant } from './check-instant';
import { bringInLine } from './bring-in-line';
import { runCommand, type CommandContext } from './command-context';
import { createOnce, type Created } from './create-once';
import { spirometryColumns, writeSpirometryFacts } from './write-spirometry-facts';

/**
 * Records one test, or a pair before and after bronchodilator, in one transaction: the test with its maneuvers, its
 * measurements, body size, the enrollment's summary and the audit event.
 */
export async function recordSpirometryTest(
  context: CommandContext,
  patient: Patient,
  body: SpirometryTestCreate | SpirometryPairCreate,
): Promise<Created<SpirometryTest[]>> {
  const tests = 'tests' in body ? body.tests : [body];
  tests.forEach((test, index) =>
    checkInstant(
      context,
      patient,
      new Date(test.performedAt),
      'tests' in body ? `tests.${index}.performedAt` : 'performedAt',
    ),
  );
  const key = tests.find((test) => test.id !== undefined)?.id;
  context.audit.showsPatients(patient.id);
  return await runCommand(context, async () => {
    // one writer a patient at a time, so that summaries and flags see every test
    await Patient.findByPk(patient.id, { lock: true, attributes: ['id'] });
    const visitId = tests[0]?.visitId ?? randomUUID();
    await refuseForeignVisit(patient, visitId);
    const created = await createOnce<SpirometryTest[]>(context, {
      kind: 'spirometry-test',
      id: key,
      request: { patientId: patient.id, body },
      find: (id) => findVisit(id, tests.length),
      create: async (id) => {
        const rows: SpirometryTest[] = [];
        for (const test of tests) {
          const own = key === undefined && rows.length === 0 ? id : randomUUID();
          rows.push(await writeOne(context, patient, test, test.id ?? own, visitId));
        }
        await bringInLine(context, patient);
        return rows;
      },
    });
    for (const row of created.row) context.audit.about('spirometry-test', row.id);
    return created;
  });
}

async function writeOne(
  context: CommandContext,
  patient: Patient,
  test: SpirometryTestCreate,
  id: string,
  visitId: string,
): Promise<SpirometryTest> {
  const row = await SpirometryTest.create({
    ...spirometryColumns(test),
    id,
    clinicId: patient.clinicId,
    patientId: patient.id,
    visitId,
    recordedBy: context.actor.userId,
  });
  await writeSpirometryFacts(context, patient, row, test.maneuvers);
  return row;
}

async function refuseForeignVisit(patient: Patient, visitId: string): Promise<void> {
  const foreign = await SpirometryTest.findOne({ where: { visitId, patientId: { [Op.ne]: patient.id } } });
  if (foreign) throw invalidInput({ path: 'visitId', message: 'This visit belongs to another patient' });
}

async function findVisit(id: string, count: number): Promise<SpirometryTest[] | null> {
  const first = await SpirometryTest.findByPk(id);
  if (!first) return null;
  if (count === 1) return [first];
  return await SpirometryTest.findAll({
    where: { visitId: first.visitId },
    order: ['createdAt', 'performedAt', 'id'],
    limit: count,
  });
}
