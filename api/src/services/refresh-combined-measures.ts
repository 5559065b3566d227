import { fromStored, getMeasure, isMeasureId, measures, type Measure } from '@slighthill/shared/measures';
import { randomUUID } from 'node:crypto';
import { requireTransaction } from '../db/in-transaction';
import { Measurement } from '../models/measurement';
import type { Patient } from '../models/patient';
import { clinicDate } from '../time/clinic-time';
import type { CommandContext } from './command-context';
import { syncMeasurements } from './sync-measurements';

/** Worked out from results that are entered one by one, such as RV/TLC. */
const combined = measures.filter(
  ({ entry, derivedFrom }) =>
    entry === 'derived' &&
    derivedFrom !== null &&
    derivedFrom.measures.length > 1 &&
    derivedFrom.measures.every((id) => getMeasure(id).entry === 'single'),
);

/**
 * Brings measures that follow from several single results in line: one a clinic day and set of conditions, from the
 * last result of each input; taken back when an input goes.
 */
export async function refreshCombinedMeasures(context: CommandContext, patient: Patient): Promise<void> {
  requireTransaction();
  const ids = combined.flatMap((measure) => [measure.id, ...measure.derivedFrom!.measures]);
  const rows = await Measurement.findAll({
    where: { patientId: patient.id, measure: ids },
    order: ['takenAt', 'createdAt', 'id'],
  });
  if (rows.length === 0) return;
  const groupOf = (row: Measurement) =>
    `${clinicDate(row.takenAt, context.actor.clinic.timeZone)} ${JSON.stringify(row.conditions)}`;
  for (const measure of combined) {
    const groups = new Map<string, Measurement[]>();
    for (const row of rows) groups.set(groupOf(row), [...(groups.get(groupOf(row)) ?? []), row]);
    for (const group of groups.values()) await refreshGroup(context, patient, measure, group);
  }
}

async function refreshGroup(context: CommandContext, patient: Patient, measure: Measure, group: Measurement[]) {
  const { measures: inputIds, compute } = measure.derivedFrom!;
  const newest = inputIds.flatMap((id) => group.filter((row) => row.measure === id && row.voidedAt === null).slice(-1));
  const earlier = group.find((row) => row.measure === measure.id && row.sourceKind === 'derived');
  const complete = newest.length === inputIds.length;
  if (!complete && !earlier) return;
  const base = newest.at(-1) ?? earlier!;
  const withHeight = newest.find((row) => row.heightCm !== null) ?? base;
  const last = newest.reduce((a, b) => (b.takenAt > a.takenAt ? b : a), base);
  const value = complete ? compute(valuesOf(newest), withHeight.heightCm) : null;
  const source = {
    kind: 'derived' as const,
    id: earlier?.sourceId ?? randomUUID(),
    takenAt: last.takenAt,
    heightCm: withHeight.heightCm,
    heightMethod: withHeight.heightMethod,
    heightCarried: withHeight.heightCarried,
    weightKg: withHeight.weightKg,
  };
  const facts = value === null ? [] : [{ measure: measure.id, value, conditions: base.conditions }];
  await syncMeasurements(context, patient, source, facts);
}

const valuesOf = (rows: Measurement[]) =>
  Object.fromEntries(
    rows.flatMap((row) => (isMeasureId(row.measure) ? [[row.measure, fromStored(row.measure, row.value)]] : [])),
  );
