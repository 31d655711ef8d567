import { z } from 'zod';
import { batchFields } from '#shared/batch-fields.ts';
import { BATCH_HISTORY_COLUMNS, LIST_SEPARATOR, faultOfColumn, type BatchHistoryColumn } from '#shared/batch-history.ts';
import { day, text } from '#shared/http/fields.ts';
import type { ImportProblem, ImportUnits } from '#shared/imports.ts';
import { celsiusFromFahrenheit } from '#shared/units/temperature.ts';
import { Method } from '#shared/words/methods.ts';
import type { SheetRow } from './sheet.ts';

const { oilTemperatureC, lyeTemperatureC, roomTemperatureC, humidityFraction, waterToLye, superfatFraction, gel, blendSeconds, cutHours, bars, note } = batchFields;

/** One row of a history as the log will hold it; the same limits as for a batch typed by hand. */
const HistoryRow = z.object({
  code: text('Batch code', 40),
  madeOn: day('Made on'),
  method: Method,
  formulaName: z.string().max(120, 'Formula must have at most 120 characters').nullable(),
  makerName: z.string().max(120, 'Maker must have at most 120 characters').nullable(),
  mouldName: z.string().max(80, 'Mould must have at most 80 characters').nullable(),
  oilTemperatureC, lyeTemperatureC, roomTemperatureC, humidityFraction, waterToLye, superfatFraction, gel, blendSeconds, cutHours, bars, note,
  fragranceFraction: z.number().min(0, 'Fragrance load must lie between 0 and 12 % of the oils').max(0.12, 'Fragrance load must lie between 0 and 12 % of the oils').nullable(),
  fragranceLots: z.array(z.string().max(60, 'A lot code must have at most 60 characters')).max(12, 'At most 12 lots in one cell'),
  colourants: z.array(z.string().max(120, 'A colourant must have at most 120 characters')).max(12, 'At most 12 colourants in one cell'),
});
export type HistoryRow = z.infer<typeof HistoryRow> & {
  /** Severity 1..3 where found, 0 where clear; a fault that is not here was not checked. */
  answers: Map<string, number>;
};

const METHOD_WORDS = new Map<string, Method>(Object.entries({
  cold: 'cold', coldprocess: 'cold', cp: 'cold', coldoven: 'cold-oven', coldovengelled: 'cold-oven', ovengelled: 'cold-oven', cpop: 'cold-oven',
  hot: 'hot', hotprocess: 'hot', hp: 'hot', hotfluid: 'hot-fluid', fluid: 'hot-fluid', fluidhot: 'hot-fluid', fluidhotprocess: 'hot-fluid', rebatch: 'rebatch',
} satisfies Record<string, Method>));

/** Field of the schema behind each column of the sheet. */
const FIELD_OF: Record<BatchHistoryColumn, string> = {
  batch_code: 'code', made_on: 'madeOn', method: 'method', formula: 'formulaName', maker: 'makerName', mould: 'mouldName',
  oil_temperature_c: 'oilTemperatureC', lye_temperature_c: 'lyeTemperatureC', room_temperature_c: 'roomTemperatureC', humidity_pct: 'humidityFraction',
  water_to_lye: 'waterToLye', lye_concentration_pct: 'concentration', superfat_pct: 'superfatFraction', fragrance_pct: 'fragranceFraction',
  fragrance_lots: 'fragranceLots', colourants: 'colourants', gel: 'gel', blend_seconds: 'blendSeconds', cut_hours: 'cutHours', bars: 'bars', notes: 'note',
};
const KIND_OF = new Map<string, (typeof BATCH_HISTORY_COLUMNS)[number]['kind']>(BATCH_HISTORY_COLUMNS.map(({ name, kind }) => [name, kind]));
/** How far ratio and concentration may disagree when a sheet gives both; sheets round to two digits. */
const RATIO_TOLERANCE = 0.03;

class CellProblem extends Error {}

function numberIn(cell: string, units: ImportUnits): number {
  const compact = cell.replaceAll(/\s/g, '').replace('−', '-').replace(/%$/, '');
  const pointed = units.decimal === 'comma' ? compact.replaceAll('.', '').replace(',', '.') : compact;
  if (pointed.length > 40 || !/^[+-]?(?:\d+(?:\.\d*)?|\.\d+)(?:e[+-]?\d{1,3})?$/i.test(pointed)) throw new CellProblem(`“${cell.slice(0, 40)}” is not a number`);
  return Number(pointed);
}

function dayIn(cell: string, units: ImportUnits): string {
  if (/^\d{4}-\d{2}-\d{2}(?:[T ].*)?$/.test(cell)) return cell.slice(0, 10);
  const parts = /^(\d{1,4})[./-](\d{1,2})[./-](\d{1,4})$/.exec(cell);
  if (!parts) throw new CellProblem(`“${cell.slice(0, 40)}” is not a day such as 2026-03-14`);
  const [, a = '', b = '', c = ''] = parts;
  const [year, month, date] = units.day === 'year-month-day' ? [a, b, c] : units.day === 'day-month-year' ? [c, b, a] : [c, a, b];
  return `${year.length === 2 ? `20${year}` : year}-${month.padStart(2, '0')}-${date.padStart(2, '0')}`;
}

function severityIn(cell: string): number {
  const word = cell.toLowerCase();
  if (word === 'clear' || word === '0') return 0;
  if (/^[123](?:\.0)?$/.test(word)) return Number(word);
  throw new CellProblem(`“${cell.slice(0, 40)}” must be clear, 1, 2, 3 or nothing (not checked)`);
}

function valueIn(kind: string, cell: string, units: ImportUnits): unknown {
  switch (kind) {
    case 'day': return dayIn(cell, units);
    case 'method': return METHOD_WORDS.get(cell.toLowerCase().replaceAll(/[^a-z]/g, '')) ?? cell;
    case 'gel': return cell.toLowerCase().replaceAll(/[\s_]/g, '-');
    case 'list': return cell.split(LIST_SEPARATOR).map((part) => part.trim()).filter(Boolean);
    case 'temperature': return units.temperature === 'fahrenheit' ? celsiusFromFahrenheit(numberIn(cell, units)) : numberIn(cell, units);
    case 'percent': return units.share === 'percent' ? numberIn(cell, units) / 100 : numberIn(cell, units);
    case 'number': return numberIn(cell, units);
    default: return cell;
  }
}

/** The ratio from whichever was given; both must tell the same. */
function ratioOf(values: Record<string, unknown>): unknown {
  const { waterToLye: ratio, concentration } = values as { waterToLye?: number; concentration?: number };
  if (concentration === undefined) return ratio ?? null;
  if (concentration <= 0 || concentration >= 1) throw new CellProblem('Lye concentration must lie between 15 and 50 %');
  const fromConcentration = (1 - concentration) / concentration;
  if (ratio === undefined) return fromConcentration;
  if (Math.abs(ratio - fromConcentration) > RATIO_TOLERANCE * ratio) {
    throw new CellProblem(`Water to lye ${ratio} and lye concentration ${(concentration * 100).toFixed(1)} % disagree: ${ratio} is ${(100 / (1 + ratio)).toFixed(1)} %`);
  }
  return ratio;
}

/** Columns of the sheet by the field they fill, prepared once for all rows. */
export interface Reader {
  heads: readonly string[];
  columns: { index: number; target: string; fault: string | undefined }[];
  units: ImportUnits;
}

/** One row as a batch, or its problems by line and column. */
export function readRow({ heads, columns, units }: Reader, { line, cells }: SheetRow): { row: HistoryRow } | { problems: ImportProblem[] } {
  const problems: ImportProblem[] = [];
  const values: Record<string, unknown> = {};
  const answers = new Map<string, number>();
  const columnOf = new Map<string, string>();
  const tell = (column: string, error: unknown) => {
    if (!(error instanceof CellProblem)) throw error;
    problems.push({ line, column, detail: error.message });
  };
  if (cells.length > heads.length) problems.push({ line, column: heads[heads.length - 1] ?? '', detail: `The row has ${cells.length} cells, the head has ${heads.length}` });
  for (const { index, target, fault } of columns) {
    const cell = (cells[index] ?? '').trim();
    const head = heads[index] ?? '';
    if (fault === undefined) columnOf.set(FIELD_OF[target as BatchHistoryColumn], head);
    if (cell === '') continue;
    try {
      if (fault === undefined) values[FIELD_OF[target as BatchHistoryColumn]] = valueIn(KIND_OF.get(target) ?? 'text', cell, units);
      else answers.set(fault, severityIn(cell));
    } catch (error) {
      tell(head, error);
    }
  }
  try {
    values['waterToLye'] = ratioOf(values);
  } catch (error) {
    tell(columnOf.get('concentration') ?? '', error);
    values['waterToLye'] = null;
  }
  for (const field of ['blendSeconds', 'bars']) if (typeof values[field] === 'number') values[field] = Math.round(values[field]);
  const told = new Set(problems.map(({ column }) => column));
  const read = HistoryRow.safeParse({ formulaName: null, makerName: null, mouldName: null, fragranceFraction: null, fragranceLots: [], colourants: [], ...values });
  if (!read.success) {
    for (const issue of read.error.issues) {
      const column = columnOf.get(String(issue.path[0])) ?? String(issue.path[0]);
      if (!told.has(column)) problems.push({ line, column, detail: issue.message });
    }
  }
  return problems.length > 0 || !read.success ? { problems } : { row: { ...read.data, answers } };
}

/** Prepares the columns. The fault of a `fault:` target is looked up once. */
export function readerOf(heads: readonly string[], targets: readonly (string | null)[], units: ImportUnits): Reader {
  const columns = targets.flatMap((target, index) => (target === null || index >= heads.length ? [] : [{ index, target, fault: faultOfColumn(target) }]));
  return { heads, columns, units };
}
