type Given<T> = { [Key in keyof T]?: Exclude<T[Key], undefined> };

/** Drops what was not said, so that a change touches only the fields it names. */
export function given<T extends object>(changes: T): Given<T> {
  return Object.fromEntries(Object.entries(changes).filter(([, value]) => value !== undefined)) as Given<T>;
}
