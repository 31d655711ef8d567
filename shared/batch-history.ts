/**
 * The batch history CSV: one row a batch, RFC 4180, header row, UTF-8, SI units. Export writes it,
 * import reads it. Beside these stands one column `fault:<slug>` per fault, holding
 * `clear`, `1`, `2`, `3` or nothing (not checked).
 */
export const BATCH_HISTORY_COLUMNS = [
  { name: 'batch_code', holds: 'Batch code', kind: 'text', required: true },
  { name: 'made_on', holds: 'Made on', kind: 'day', required: true },
  { name: 'method', holds: 'Method', kind: 'method', required: true },
  { name: 'formula', holds: 'Formula', kind: 'text', required: false },
  { name: 'maker', holds: 'Maker', kind: 'text', required: false },
  { name: 'mould', holds: 'Mould', kind: 'text', required: false },
  { name: 'oil_temperature_c', holds: 'Oil temperature', kind: 'temperature', required: false },
  { name: 'lye_temperature_c', holds: 'Lye temperature', kind: 'temperature', required: false },
  { name: 'room_temperature_c', holds: 'Room temperature', kind: 'temperature', required: false },
  { name: 'humidity_pct', holds: 'Humidity', kind: 'percent', required: false },
  { name: 'water_to_lye', holds: 'Water to lye', kind: 'number', required: false },
  { name: 'lye_concentration_pct', holds: 'Lye concentration', kind: 'percent', required: false },
  { name: 'superfat_pct', holds: 'Superfat', kind: 'percent', required: false },
  { name: 'fragrance_pct', holds: 'Fragrance load', kind: 'percent', required: false },
  { name: 'fragrance_lots', holds: 'Fragrance lots', kind: 'list', required: false },
  { name: 'colourants', holds: 'Colourants', kind: 'list', required: false },
  { name: 'gel', holds: 'Gel', kind: 'gel', required: false },
  { name: 'blend_seconds', holds: 'Blend seconds', kind: 'number', required: false },
  { name: 'cut_hours', holds: 'Hours to the cut', kind: 'number', required: false },
  { name: 'bars', holds: 'Bars', kind: 'number', required: false },
  { name: 'notes', holds: 'Notes', kind: 'text', required: false },
] as const;

export type BatchHistoryColumn = (typeof BATCH_HISTORY_COLUMNS)[number]['name'];

/** Head of a fault's column. */
export function faultColumn(slug: string): string {
  return `fault:${slug}`;
}

/** The fault that a column head names, or undefined. */
export function faultOfColumn(head: string): string | undefined {
  return /^fault:([a-z][a-z\d-]{0,59})$/.exec(head.trim().toLowerCase())?.[1];
}

/** Several lots or colourants in one cell stand apart by a semicolon. */
export const LIST_SEPARATOR = ';';

/** Methods as the sheet writes them. */
export const METHOD_IN_HISTORY = { cold: 'cold', 'cold-oven': 'cold, oven-gelled', hot: 'hot', 'hot-fluid': 'hot, fluid', rebatch: 'rebatch' } as const;
