import { fromStored, getMeasure, isMeasureId, measures, type Measure } from '@slighthill/shared/measures';
import { randomUUID } from 'node:crypto';
import { requireTransaction } from '../db/in-transaction';
import { Measurement } from '../models/measurement';
import type { Patient } from '../models/patient';
import type { CommandContext } from './command-context';
import { syncMeasurements, type Fact } from './sync-measurements';

/** Adds to the facts of one source what follows from them alone (BMI from a weight and the height beside it). */
export function withDerivedFacts(facts: readonly Fact[], heightCm: number | null): Fact[] {
  const derived = measures.flatMap((measure) => {
    const rule = measure.derivedFrom;
    if (!rule || measure.entry !== 'derived' || (rule.needsHeight && heightCm === null)) return [];
    const inputs = facts.filter((fact) => rule.measures.includes(fact.measure));
    if (inputs.length < rule.measures.length) return [];
    const value = rule.compute(Object.fromEntries(inputs.map((input) => [input.measure, input.value])), heightCm);
    if (value === null) return [];
    const { state = null, quality = null } = inputs[0]!;
    return [{ measure: measure.id, value, state, quality, conditions: inputs[0]!.conditions ?? {} }];
  });
  return [...facts, ...derived];
}

/**
 * Measures that follow from two results entered one by one (RV/TLC): worked out when both were taken at the same
 * instant under the same conditions, and taken back when one of them goes.
 */
export async function refreshCombinedMeasures(
  context: CommandContext,
  patient: Patient,
  changed: string,
  instants: readonly Date[],
): Promise<void> {
  requireTransaction();
  const affected = measures.filter(
    (measure) => isCombined(measure) && measure.derivedFrom!.measures.some((id) => id === changed),
  );
  for (const measure of affected) for (const at of instants) await refreshOne(context, patient, measure, at);
}

const isCombined = (measure: Measure): boolean =>
  measure.entry === 'derived' &&
  measure.derivedFrom !== null &&
  measure.derivedFrom.measures.length > 1 &&
  measure.derivedFrom.measures.every((id) => getMeasure(id).entry === 'single');

async function refreshOne(context: CommandContext, patient: Patient, measure: Measure, at: Date): Promise<void> {
  const inputs = await Measurement.findAll({
    where: { patientId: patient.id, takenAt: at, measure: [...measure.derivedFrom!.measures], voidedAt: null },
    order: ['createdAt'],
  });
  const newest = measure.derivedFrom!.measures.map((id) => inputs.filter((row) => row.measure === id).at(-1));
  const [first] = newest;
  const complete =
    first !== undefined &&
    newest.every((row) => row && JSON.stringify(row.conditions) === JSON.stringify(first.conditions));
  const earlier = await Measurement.findOne({
    where: { patientId: patient.id, takenAt: at, measure: measure.id, sourceKind: 'derived' },
  });
  if (!complete && !earlier) return;
  const id = earlier?.sourceId ?? randomUUID();
  const base = first ?? earlier!;
  const source = {
    kind: 'derived' as const,
    id,
    takenAt: at,
    heightCm: base.heightCm,
    heightMethod: base.heightMethod,
    heightCarried: base.heightCarried,
    weightKg: base.weightKg,
  };
  const value = complete ? measure.derivedFrom!.compute(valuesOf(newest as Measurement[]), base.heightCm) : null;
  const facts: Fact[] = value === null ? [] : [{ measure: measure.id, value, conditions: base.conditions }];
  await syncMeasurements(context, patient, source, facts);
}

const valuesOf = (rows: Measurement[]) =>
  Object.fromEntries(
    rows.flatMap((row) => (isMeasureId(row.measure) ? [[row.measure, fromStored(row.measure, row.value)]] : [])),
  );
