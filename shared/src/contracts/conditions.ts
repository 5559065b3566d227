import { getMeasure, type Condition, type MeasureId } from '../measures/registry';

export type Conditions = Record<string, number | boolean | string>;

const anyAmount = { min: 0, max: 10_000 };

function numberProblem({ label, range = anyAmount, unit, whole }: Condition, value: number): string | null {
  if (!(value >= range.min && value <= range.max))
    return `${label} must be ${range.min} to ${range.max}${unit ? ` ${unit}` : ''}`;
  return whole && !Number.isInteger(value) ? `${label} must be a whole number` : null;
}

function conditionProblem(condition: Condition, value: number | boolean | string): string | null {
  const { label, type } = condition;
  if (type === 'choice') {
    const choices: readonly unknown[] = condition.choices ?? [];
    return choices.includes(value) ? null : `${label} must be one of ${choices.join(', ')}`;
  }
  if (type === 'boolean') return typeof value === 'boolean' ? null : `${label} must be yes or no`;
  return typeof value === 'number' ? numberProblem(condition, value) : `${label} must be a number`;
}

/** Says what is wrong with comparison conditions: keys the registry does not declare, or values it does not allow. */
export function checkConditions(measureId: MeasureId, conditions: Conditions): { key: string; message: string }[] {
  const declared = getMeasure(measureId).conditions;
  return Object.entries(conditions).flatMap(([key, value]) => {
    const condition = declared[key];
    if (!condition) return [{ key, message: `${getMeasure(measureId).label} has no condition "${key}"` }];
    const message = conditionProblem(condition, value);
    return message === null ? [] : [{ key, message }];
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
