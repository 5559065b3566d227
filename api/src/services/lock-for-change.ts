import type { Model, ModelStatic, WhereOptions } from 'sequelize';
import { Transaction } from 'sequelize';
import { requireTransaction } from '../db/in-transaction';
import { AppError, notFound, staleVersion } from '../errors/app-error';
import { Patient } from '../models/patient';
import { visibleTo } from '../policies/policy';
import type { CommandContext } from './command-context';

interface Versioned {
  id: string;
  clinicId: string;
  version: number;
}

/** Loads a row of the actor's clinic for update and refuses a stale version: nothing is ever overwritten unseen. */
export async function lockForChange<Row extends Model & Versioned>(
  context: CommandContext,
  model: ModelStatic<Row>,
  id: string,
  version: number,
): Promise<Row> {
  requireTransaction();
  const where = { id, ...visibleTo(context.actor) } as unknown as WhereOptions<Row['_attributes']>;
  await lockPatientOf(model, where);
  const row = await model.findOne({ where, lock: Transaction.LOCK.UPDATE });
  if (!row) throw notFound();
  if (row.version !== version) throw staleVersion();
  return row;
}

/**
 * What belongs to a patient is changed behind the patient's own lock, taken first by everyone: two people working on
 * one record wait for each other instead of deadlocking.
 */
async function lockPatientOf<Row extends Model>(model: ModelStatic<Row>, where: WhereOptions<Row['_attributes']>) {
  if (!('patientId' in model.getAttributes())) return;
  const seen = await model.findOne({ where, attributes: ['patientId'] });
  const patientId = seen?.get('patientId') as string | null | undefined;
  if (patientId) await Patient.findByPk(patientId, { lock: true, attributes: ['id'] });
}

/** The same for a clinical entry: a voided one is not changed any more. */
export async function lockEntryForChange<Row extends Model & Versioned & { voidedAt: Date | null }>(
  context: CommandContext,
  model: ModelStatic<Row>,
  id: string,
  version: number,
): Promise<Row> {
  const row = await lockForChange(context, model, id, version);
  if (row.voidedAt !== null) throw new AppError('wrong-state', 'This entry was voided and is not changed any more.');
  return row;
}
