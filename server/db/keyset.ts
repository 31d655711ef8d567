import { invalidField } from '../problem.ts';

/** Opaque cursor of the last row of a page: the values it was ordered by. */
export function cursorOf(values: readonly (string | number | null)[]): string {
  return Buffer.from(JSON.stringify(values)).toString('base64url');
}

/**
 * The values in a cursor.
 *
 * @param length how many values the list's order has
 * @throws Problem 422 when the cursor is not one of ours
 */
export function readCursor(cursor: string, length: number): (string | number | null)[] {
  try {
    const values: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    if (Array.isArray(values) && values.length === length && values.every((value) => value === null || typeof value === 'string' || typeof value === 'number')) {
      return values as (string | number | null)[];
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
