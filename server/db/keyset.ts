import { invalidField } from '../problem.ts';

/** Opaque cursor of the last row of a page: the values it was ordered by. */
export function cursorOf(values: readonly (string | number | null)[]): string {
  return Buffer.from(JSON.stringify(values)).toString('base64url');
}

const KINDS = {
  text: (value: unknown) => typeof value === 'string' && !value.includes('\u0000'),
  day: (value: unknown) => typeof value === 'string' && /^\d{4}-\d\d-\d\d$/.test(value) && !Number.isNaN(Date.parse(value)),
  number: (value: unknown) => typeof value === 'number',
  integer: (value: unknown) => Number.isInteger(value) && Math.abs(value as number) < 2 ** 31,
  uuid: (value: unknown) => typeof value === 'string' && /^[\da-f]{8}(?:-[\da-f]{4}){3}-[\da-f]{12}$/i.test(value),
};
export type KeyKind = keyof typeof KINDS;

/**
 * The values in a cursor.
 *
 * @param kinds kind of each value of the list's order; anybody can write a cursor, so they are checked
 * @throws Problem 422 when the cursor is not one of ours
 */
export function readCursor(cursor: string, kinds: readonly KeyKind[]): (string | number)[] {
  try {
    const values: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    if (Array.isArray(values) && values.length === kinds.length && kinds.every((kind, index) => KINDS[kind](values[index]))) {
      return values as (string | number)[];
    }
  } catch {
    // Not JSON: told the same way as a cursor of the wrong shape.
  }
  throw invalidField('#/cursor', 'Cursor is not one of ours; start again without it');
}

/** Cuts the one row too many that tells whether a next page exists. */
export function pageFrom<Row>(rows: Row[], limit: number, key: (row: Row) => readonly (string | number | null)[]): { items: Row[]; next: string | null } {
  if (rows.length <= limit) return { items: rows, next: null };
  const items = rows.slice(0, limit);
  return { items, next: cursorOf(key(items[items.length - 1] as Row)) };
}
