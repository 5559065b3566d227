import { measures } from '@slighthill/shared/measures';
import type { Fact } from './sync-measurements';

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
