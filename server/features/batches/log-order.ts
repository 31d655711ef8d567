import type { BatchesChoice } from '#shared/batches.ts';
import type { KeyKind } from '#server/db/keyset.ts';

/** A keyset order: the key's expression, its type, and its direction; ties go by id. */
export interface LogOrder {
  key: string;
  cast: 'date' | 'text' | 'float8' | 'int';
  kind: KeyKind;
  direction: 'asc' | 'desc';
}

/**
 * Each sort of the log by an expression that has an index of its own. Measures that are not recorded come
 * last both ways, so each direction has its own stand-in beyond the hard limits.
 */
export function orderOf({ sort, order }: Pick<BatchesChoice, 'sort' | 'order'>): LogOrder {
  const measure = (column: string): LogOrder => ({
    key: order === 'desc' ? `coalesce(b.${column}, '-1'::double precision)` : `coalesce(b.${column}, '1000000'::double precision)`,
    cast: 'float8',
    kind: 'number',
    direction: order,
  });
  switch (sort) {
    case 'made':
      return { key: 'b.made_on', cast: 'date', kind: 'day', direction: order };
    case 'code':
      return { key: 'b.code', cast: 'text', kind: 'text', direction: order };
    case 'water':
      return measure('water_to_lye');
    case 'oils':
      return measure('oil_temperature_c');
    case 'load':
      return measure('fragrance_fraction');
    case 'worst':
      return { key: 'o.worst', cast: 'int', kind: 'integer', direction: order };
  }
}
