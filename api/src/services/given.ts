type Given<T> = { [Key in keyof T]?: Exclude<T[Key], undefined> };

/** Drops what was not said, so that a change touches only the fields it names. */
export function given<T extends object>(changes: T): Given<T> {
  return Object.fromEntries(Object.entries(changes).filter(([, value]) => value !== undefined)) as Given<T>;
}

/** What a row said in the fields that are about to change. */
export function before(row: object, changes: object): Record<string, unknown> {
  return Object.fromEntries(Object.keys(changes).map((key) => [key, (row as Record<string, unknown>)[key] ?? null]));
}
