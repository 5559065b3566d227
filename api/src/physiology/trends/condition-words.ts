import type { Condition, Measure } from '@slighthill/shared/measures';

type Conditions = Readonly<Record<string, unknown>>;

/** A condition as stored, or the registry's default. */
export const conditionValue = (condition: Condition, key: string, conditions: Conditions): unknown =>
  conditions[key] ?? condition.default ?? null;

const blockingOf = new Map<string, readonly (readonly [string, Condition])[]>();

/** The conditions of a measure in which compared results must agree; read for every point, so kept. */
export function blockingConditions(measure: Measure): readonly (readonly [string, Condition])[] {
  const found = blockingOf.get(measure.id);
  if (found) return found;
  const blocking = Object.entries(measure.conditions).filter(([, condition]) => condition.onDifference === 'blocks');
  blockingOf.set(measure.id, blocking);
  return blocking;
}

/** What must be equal for two results of a measure to be compared, besides the bronchodilator state. */
export function blockingKey(measure: Measure, conditions: Conditions): string {
  let key = '';
  for (const [name, condition] of blockingConditions(measure))
    key += `${name}=${String(conditionValue(condition, name, conditions))};`;
  return key;
}

export function valueWords(condition: Condition, value: unknown): string {
  if (value === null || value === undefined) return 'not stated';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  const index = condition.choices?.indexOf(String(value)) ?? -1;
  const label = condition.choiceLabels?.[index]?.toLowerCase() ?? String(value);
  return condition.unit ? `${label} ${condition.unit}` : label;
}

/** "course length 20 m instead of 30 m": the blocking conditions in which a result differs from the compared ones. */
export function blockingDifference(measure: Measure, conditions: Conditions, compared: Conditions): string {
  return blockingConditions(measure)
    .map(([name, condition]) => ({
      condition,
      value: conditionValue(condition, name, conditions),
      other: conditionValue(condition, name, compared),
    }))
    .filter(({ value, other }) => value !== other)
    .map(
      ({ condition, value, other }) =>
        `${condition.label.toLowerCase()} ${valueWords(condition, value)} instead of ${valueWords(condition, other)}`,
    )
    .join(', ');
}
