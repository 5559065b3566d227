/** A list of values with their words, in order, as choices for a select or a radio group. */
export const choicesOf = <Value extends string>(
  values: readonly Value[],
  labels: Record<Value, string>,
): { value: Value; label: string }[] => values.map((value) => ({ value, label: labels[value] }));
