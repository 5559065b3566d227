/** Turns named `$parameters` into the driver's numbered ones. */
export function positional(sql: string, values: Record<string, unknown>): [string, unknown[]] {
  const names: string[] = [];
  const text = sql.replace(/\$([a-z]\w*)/gi, (_all, name: string) => {
    if (!names.includes(name)) names.push(name);
    return `$${names.indexOf(name) + 1}`;
  });
  return [text, names.map((name) => values[name] ?? null)];
}
