export interface BenchRow {
  what: string;
  measured: string;
  reference: string;
  ratio: number | null;
  aim: string;
  met: boolean;
}

/** Prints rows as a table with one line a measurement. */
export function printTable(title: string, rows: readonly BenchRow[]): void {
  const cells = rows.map((row) => [
    row.what,
    row.measured,
    row.reference,
    row.ratio === null ? '' : row.ratio.toFixed(2),
    row.aim,
    row.met ? 'met' : 'missed',
  ]);
  const head = ['what', 'measured', 'beside', 'ratio', 'aim', ''];
  const widths = head.map((name, column) => Math.max(name.length, ...cells.map((row) => row[column]!.length)));
  const line = (row: readonly string[]) =>
    row
      .map((cell, column) => cell.padEnd(widths[column]!))
      .join('  ')
      .trimEnd();
  console.log(`\n${title}\n${line(head)}\n${widths.map((width) => '-'.repeat(width)).join('  ')}`);
  for (const row of cells) console.log(line(row));
}
