import type { Method } from './words/methods.ts';

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
export const METHOD_IN_HISTORY = { cold: 'cold', 'cold-oven': 'cold, oven-gelled', hot: 'hot', 'hot-fluid': 'hot, fluid', rebatch: 'rebatch' } as const satisfies Record<Method, string>;

/** One batch as the history tells it; SI inside, shares as fractions. */
export interface BatchHistoryRow {
  code: string;
  madeOn: string;
  method: Method;
  formulaName: string | null;
  makerName: string | null;
  mouldName: string | null;
  oilTemperatureC: number | null;
  lyeTemperatureC: number | null;
  roomTemperatureC: number | null;
  humidityFraction: number | null;
  waterToLye: number | null;
  lyeConcentrationFraction: number | null;
  superfatFraction: number | null;
  fragranceFraction: number | null;
  fragranceLots: readonly string[];
  colourants: readonly string[];
  gel: string | null;
  blendSeconds: number | null;
  cutHours: number | null;
  bars: number | null;
  note: string | null;
  /** Per fault answered: 0 clear, 1 to 3 the worst severity found. */
  outcomes: Readonly<Record<string, number>>;
}

/** Per cent of a fraction, without the last bits that times 100 would bring (0.07 becomes 7). */
function percent(fraction: number | null): number | null {
  return fraction === null ? null : Number((fraction * 100).toPrecision(12));
}

const CELLS: Record<BatchHistoryColumn, (row: BatchHistoryRow) => string | number | null> = {
  batch_code: (row) => row.code,
  made_on: (row) => row.madeOn,
  method: (row) => METHOD_IN_HISTORY[row.method],
  formula: (row) => row.formulaName,
  maker: (row) => row.makerName,
  mould: (row) => row.mouldName,
  oil_temperature_c: (row) => row.oilTemperatureC,
  lye_temperature_c: (row) => row.lyeTemperatureC,
  room_temperature_c: (row) => row.roomTemperatureC,
  humidity_pct: (row) => percent(row.humidityFraction),
  water_to_lye: (row) => row.waterToLye,
  lye_concentration_pct: (row) => percent(row.lyeConcentrationFraction),
  superfat_pct: (row) => percent(row.superfatFraction),
  fragrance_pct: (row) => percent(row.fragranceFraction),
  fragrance_lots: (row) => row.fragranceLots.join(LIST_SEPARATOR),
  colourants: (row) => row.colourants.join(LIST_SEPARATOR),
  gel: (row) => row.gel,
  blend_seconds: (row) => row.blendSeconds,
  cut_hours: (row) => row.cutHours,
  bars: (row) => row.bars,
  notes: (row) => row.note,
};

export function historyHead(faults: readonly string[]): string[] {
  return [...BATCH_HISTORY_COLUMNS.map(({ name }) => name), ...faults.map(faultColumn)];
}

/** The cells of one batch, in the order of `historyHead`; a fault that was not checked is empty. */
export function historyCells(row: BatchHistoryRow, faults: readonly string[]): (string | number | null)[] {
  return [...BATCH_HISTORY_COLUMNS.map(({ name }) => CELLS[name](row)), ...faults.map((fault) => outcomeCell(row.outcomes[fault]))];
}

function outcomeCell(outcome: number | undefined): string | null {
  if (outcome === undefined) return null;
  return outcome === 0 ? 'clear' : String(outcome);
}
