import type { VoidBody } from '@slighthill/shared/contracts/common';
import type { Model } from 'sequelize';
import { AppError } from '../errors/app-error';
import type { EntityKind } from '../models/clinical-revision';
import { BodySize } from '../models/body-size';
import { FileEntry } from '../models/file-entry';
import { Measurement } from '../models/measurement';
import { Patient } from '../models/patient';
import { SpirometryTest } from '../models/spirometry-test';
import { bringInLine } from './bring-in-line';
import { runCommand, type CommandContext } from './command-context';
import { lockEntryForChange } from './lock-for-change';
import { refreshFlagsOf } from './raise-flags';
import { refreshDiagnosis } from './refresh-diagnosis';

export type VoidableKind = EntityKind;

/**
 * Takes an entry out of trends, pattern, flags and summaries in one transaction. It stays readable with who, when and
 * why; nothing is deleted.
 */
export async function voidEntry(
  context: CommandContext,
  kind: VoidableKind,
  id: string,
  body: VoidBody,
): Promise<void> {
  await runCommand(context, async () => {
    const row = await lockEntry(context, kind, id, body.version);
    const patient = (await Patient.findByPk(row.patientId, { lock: true }))!;
    context.audit.showsPatients(patient.id);
    context.audit.about(kind, row.id);
    refuseDependent(row);
    const mark = {
      voidedAt: context.clock.now(),
      voidedBy: context.actor.userId,
      voidReason: body.reason,
      voidText: body.text,
    };
    await (row as Model).update({ ...mark, version: row.version + 1 });
    if (kind === 'file-entry') await refreshDiagnosis(patient);
    else await voidWhatFollows(context, kind, row, mark);
    await bringInLine(context, patient);
  });
}

type EntryRow = SpirometryTest | Measurement | BodySize | FileEntry;

async function lockEntry(context: CommandContext, kind: VoidableKind, id: string, version: number): Promise<EntryRow> {
  switch (kind) {
    case 'spirometry-test':
      return await lockEntryForChange(context, SpirometryTest, id, version);
    case 'measurement':
      return await lockEntryForChange(context, Measurement, id, version);
    case 'body-size':
      return await lockEntryForChange(context, BodySize, id, version);
    case 'file-entry':
      return await lockEntryForChange(context, FileEntry, id, version);
  }
}

function refuseDependent(row: EntryRow): void {
  if (row instanceof Measurement && (row.sourceKind !== 'measurement' || row.sourceId !== row.id))
    throw new AppError('wrong-state', 'This result follows from another entry. Void that one.');
  if (row instanceof BodySize && row.sourceKind !== 'body-size')
    throw new AppError('wrong-state', 'This height or weight came with a test. Void the test.');
}

type VoidMark = Pick<Measurement, 'voidedAt' | 'voidedBy' | 'voidReason' | 'voidText'>;

async function voidWhatFollows(
  context: CommandContext,
  kind: Exclude<VoidableKind, 'file-entry'>,
  row: EntryRow,
  mark: VoidMark,
): Promise<void> {
  const where = { sourceKind: kind, sourceId: row.id, voidedAt: null };
  await BodySize.update(mark, { where });
  await Measurement.update(mark, { where });
  if (!(row instanceof Measurement)) return;
  await refreshFlagsOf(context, row);
}
