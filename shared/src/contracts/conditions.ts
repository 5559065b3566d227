import { getMeasure, type MeasureId } from '../measures/registry';

export type Conditions = Record<string, number | boolean | string>;

/** Says what is wrong with comparison conditions: keys the registry does not declare, or values of another type. */
export function checkConditions(measureId: MeasureId, conditions: Conditions): { key: string; message: string }[] {
  const declared = getMeasure(measureId).conditions;
  return Object.entries(conditions).flatMap(([key, value]) => {
    const condition = declared[key];
    if (!condition) return [{ key, message: `${getMeasure(measureId).label} has no condition "${key}"` }];
    if (condition.type === 'choice') {
      const choices: readonly string[] = condition.choices ?? [];
      if (typeof value === 'string' && choices.includes(value)) return [];
      return [{ key, message: `${condition.label} must be one of ${choices.join(', ')}` }];
    }
    if (typeof value !== condition.type) return [{ key, message: `${condition.label} must be a ${condition.type}` }];
    if (condition.type === 'number' && !((value as number) >= 0 && (value as number) <= 10_000))
      return [{ key, message: `${condition.label} must be 0 or more` }];
    return [];
  });
}

/** Fills in the registry's defaults, so that stored conditions are always complete. */
export function withDefaultConditions(measureId: MeasureId, conditions: Conditions): Conditions {
  const filled: Conditions = {};
  for (const [key, condition] of Object.entries(getMeasure(measureId).conditions)) {
    const value = conditions[key] ?? condition.default;
    if (value !== null && value !== undefined) filled[key] = value;
  }
  return filled;
}
