import { z } from 'zod';
import { AppError } from '../errors/app-error';

/** A cursor is the sort key of the last row shown, opaque to clients. */
export function encodeCursor(key: readonly (string | number | null)[]): string {
  return Buffer.from(JSON.stringify(key)).toString('base64url');
}

const fits = {
  text: (part: unknown) => typeof part === 'string',
  index: (part: unknown) => Number.isInteger(part) && (part as number) >= 0,
  serial: (part: unknown) => typeof part === 'string' && /^\d{1,18}$/.test(part),
  date: (part: unknown) => z.iso.date().safeParse(part).success,
  instant: (part: unknown) => z.iso.datetime().safeParse(part).success,
  id: (part: unknown) => z.uuid().safeParse(part).success,
};

/** Reads a cursor back; one whose parts are not of the list's kinds was not made here. */
export function decodeCursor(
  cursor: string | undefined,
  parts: readonly (keyof typeof fits)[],
): (string | number)[] | null {
  if (cursor === undefined) return null;
  try {
    const key: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    if (Array.isArray(key) && key.length === parts.length && parts.every((kind, index) => fits[kind](key[index])))
      return key as (string | number)[];
  } catch {
    // falls through to the one answer for a cursor that was not made here
  }
  throw new AppError('invalid-input', 'This list could not be continued. Open it again.', [
    { path: 'cursor', message: 'Not a cursor of this list' },
  ]);
}

/** Splits `limit + 1` fetched rows into a page and the cursor that continues it. */
export function pageOf<Row, Item>(
  rows: Row[],
  limit: number,
  keyOf: (row: Row) => readonly (string | number | null)[],
  present: (row: Row) => Item,
): { items: Item[]; nextCursor: string | null } {
  const page = rows.slice(0, limit);
  const last = page.at(-1);
  return { items: page.map(present), nextCursor: rows.length > limit && last ? encodeCursor(keyOf(last)) : null };
}
