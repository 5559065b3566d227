import { randomUUID } from 'node:crypto';
import { requireTransaction } from '../db/in-transaction';
import { execute, selectRow } from '../db/query';
import { flagRules } from '../flags/flag-rules';
import { Flag, FlagOccurrence } from '../models/flag';
import type { Measurement } from '../models/measurement';
import type { CommandContext } from './command-context';

/**
 * Brings the flags one measurement gives rise to in line with what it says now: raises, adds an occurrence to the open
 * flag of the rule, or withdraws. Runs in the transaction that wrote the measurement.
 */
export async function refreshFlagsOf(context: CommandContext, measurement: Measurement): Promise<void> {
  requireTransaction();
  for (const rule of flagRules) {
    const detail = measurement.voidedAt === null ? rule.detail(measurement) : null;
    const occurrence = await standingOccurrence(measurement.id, rule.id);
    if (occurrence && detail === occurrence.detail) continue;
    if (occurrence) await withdraw(context, occurrence);
    if (detail !== null) await raise(context, measurement, rule.id, detail);
  }
}

/** The occurrence this measurement has under the rule, if it stands. */
async function standingOccurrence(measurementId: string, rule: string): Promise<FlagOccurrence | null> {
  const row = await selectRow<{ id: string }>(
    `select o.id from flag_occurrences o join flags f on f.id = o.flag_id
     where o.source_kind = 'measurement' and o.source_id = $measurementId and o.withdrawn_at is null
       and f.rule = $rule`,
    { measurementId, rule },
  );
  return row && (await FlagOccurrence.findByPk(row.id));
}

async function raise(context: CommandContext, measurement: Measurement, rule: string, detail: string): Promise<void> {
  const { clinicId, patientId } = measurement;
  const now = context.clock.now();
  await execute(
    `insert into flags (id, clinic_id, patient_id, rule, raised_at, created_at, updated_at)
     values ($id, $clinicId, $patientId, $rule, $now, $now, $now)
     on conflict (patient_id, rule) where status = 'open' do nothing`,
    { id: randomUUID(), clinicId, patientId, rule, now },
  );
  const open = await selectRow<{ id: string }>(
    `select id from flags where patient_id = $patientId and rule = $rule and status = 'open' for update`,
    { patientId, rule },
  );
  await FlagOccurrence.create({
    id: randomUUID(),
    clinicId,
    flagId: open!.id,
    sourceKind: 'measurement',
    sourceId: measurement.id,
    detail,
    occurredAt: measurement.takenAt,
    createdAt: now,
  });
  await execute('update flags set version = version + 1, updated_at = $now where id = $id and created_at < $now', {
    id: open!.id,
    now,
  });
}

/** Takes back one occurrence; an open flag without any left closes, saying why. */
async function withdraw(context: CommandContext, occurrence: FlagOccurrence): Promise<void> {
  const now = context.clock.now();
  await occurrence.update({ withdrawnAt: now });
  const left = await FlagOccurrence.count({ where: { flagId: occurrence.flagId, withdrawnAt: null } });
  if (left > 0) return;
  const flag = await Flag.findOne({ where: { id: occurrence.flagId, status: 'open' } });
  await flag?.update({
    status: 'resolved',
    resolvedAt: now,
    resolvedBy: context.actor.userId,
    resolution: 'The result that raised it was amended or voided',
    version: flag.version + 1,
  });
}
