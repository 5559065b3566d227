/** One thing an entry says, in words: what a page lists, and what a history compares. */
export interface Fact {
  label: string;
  value: string;
}

export interface FactChange {
  label: string;
  before: string | null;
  after: string | null;
}

/** What differs between two contents of one entry, in the order of the earlier one, then what was added. */
export const changedFacts = (before: readonly Fact[], after: readonly Fact[]): FactChange[] => {
  const valueIn = (facts: readonly Fact[], label: string): string | null =>
    facts.find((fact) => fact.label === label)?.value ?? null;
  const labels = [...new Set([...before, ...after].map(({ label }) => label))];
  return labels
    .map((label) => ({ label, before: valueIn(before, label), after: valueIn(after, label) }))
    .filter((change) => change.before !== change.after);
};

/** Keeps what has a value; nothing is drawn for what was not said. */
export const factsFrom = (entries: readonly (readonly [string, string | null | false | undefined])[]): Fact[] =>
  entries.flatMap(([label, value]) => (value ? [{ label, value }] : []));
