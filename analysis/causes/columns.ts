import { quantileOf } from '#analysis/maths/quantile.ts';
import type { BatchRow, InputSpec, LeftOut, Term } from './board-rows.ts';
import { byText, isExposed, nominalValue } from './exposure.ts';

/** One input level (0/1) or number, over all batches that count. Missing values are NaN in `values` only. */
export interface Column {
  /** Position in the bench's columns. */
  index: number;
  term: Term;
  spec: InputSpec;
  isFlag: boolean;
  values: Float64Array;
  /** Numbers: positions of recorded values, lowest first; empty for flags. */
  order: Int32Array;
  /** Group code of each batch's filled value; equal codes, equal values. */
  code: Int32Array;
  /** Value of each code, numbers in reference spreads about their mean. */
  codeValues: Float64Array;
  /** Centred within the method family and of length 1, missing filled; zeros when it does not vary. */
  within: Float64Array;
  /** Centred over all batches and of length 1. */
  plain: Float64Array;
  /** Numbers: standard deviation inside a method family; flags 1. */
  spread: number;
  /** Numbers: 10 and 90 % points in the family with most values. */
  range: { low: number; high: number } | null;
  /** Whether the board has a cell for it, and whether it may be adjusted for (one level of each set of them is the reference). */
  asked: boolean;
  candidate: boolean;
}

/** The batches that count, sorted by id, with everything about them as typed arrays. */
export interface Bench {
  rows: readonly BatchRow[];
  n: number;
  hot: Uint8Array;
  /** Codes of method and of maker, for strata; unknown makers share a code. */
  method: Int32Array;
  maker: Int32Array;
  /** Code of method and maker together. */
  stratum: Int32Array;
  /** Which lots a batch holds, as a code: batches with the same lots share it. */
  lotSet: Int32Array;
  columns: readonly Column[];
  /** Correlations of columns over all batches, by `column.index`; filled as they are asked for, NaN until then. */
  correlations: { within: Float64Array; plain: Float64Array };
  leftOut: readonly LeftOut[];
}

/** Above this many batches numbers are put into 50 bins at their means, so that equal rows collapse. */
export const EXACT_NUMBERS_UP_TO = 5000;
const BINS = 50;

/** Counts reasons; in the order of their names. */
export function tally(reasons: Iterable<string>): LeftOut[] {
  const counts = new Map<string, number>();
  for (const reason of reasons) counts.set(reason, (counts.get(reason) ?? 0) + 1);
  return [...counts].map(([reason, count]) => ({ reason, count })).sort((a, b) => byText(a.reason, b.reason));
}

/** Why a batch does not count in comparisons, or null when it does. */
export function reasonLeftOut(row: BatchRow): string | null {
  return row.leftOut ?? (row.family === 'rebatch' ? 'rebatch' : null);
}

/** Lays the batches out for the board. Cost: O(batches · levels). */
export function layOut(allRows: readonly BatchRow[], inputs: readonly InputSpec[]): Bench {
  const rows = allRows.filter((row) => reasonLeftOut(row) === null).sort((a, b) => byText(a.id, b.id));
  const n = rows.length;
  const hot = Uint8Array.from(rows, (row) => (row.family === 'hot' ? 1 : 0));
  const method = codesOf(rows.map((row) => row.method));
  const maker = codesOf(rows.map((row) => row.nominal['maker'] ?? ''));
  const strata = codesOf(rows.map((row) => `${row.method}\n${row.nominal['maker'] ?? ''}`));
  const columns = [...inputs].sort((a, b) => byText(a.slug, b.slug)).flatMap((spec) => columnsOf(rows, spec, { hot, method, strata }));
  for (const [index, own] of columns.entries()) own.index = index;
  const lots = inputs.filter((spec) => spec.class === 'lot').map((spec) => spec.slug).sort(byText);
  const lotSet = codesOf(rows.map((row) => lots.map((slug) => [...(row.holds[slug] ?? [])].sort(byText).join('\t')).join('\n')));
  const pairs = () => new Float64Array(columns.length ** 2).fill(Number.NaN);
  const leftOut = tally(allRows.flatMap((row) => reasonLeftOut(row) ?? []));
  return { rows, n, hot, method, maker, stratum: strata, lotSet, columns, correlations: { within: pairs(), plain: pairs() }, leftOut };
}

function codesOf(values: readonly string[]): Int32Array {
  const code = new Map([...new Set(values)].sort(byText).map((value, i) => [value, i]));
  return Int32Array.from(values, (value) => code.get(value)!);
}

interface Keys { hot: Uint8Array; method: Int32Array; strata: Int32Array }

function columnsOf(rows: readonly BatchRow[], spec: InputSpec, keys: Keys): Column[] {
  if (spec.kind === 'number') {
    const values = Float64Array.from(rows, (row) => row.numbers[spec.slug] ?? Number.NaN);
    return [column({ input: spec.slug, level: null }, spec, values, keys, { asked: true, candidate: true })];
  }
  const counts = new Map<string, number>();
  for (const row of rows) {
    const one = spec.kind === 'held' ? (row.holds[spec.slug] ?? []) : [nominalValue(row, spec.slug)];
    for (const level of new Set(one)) if (level !== null) counts.set(level, (counts.get(level) ?? 0) + 1);
  }
  const levels = [...counts.keys()].sort(byText);
  const references = referencesAmong(levels, counts, spec, rows);
  return levels.map((level) => {
    const values = Float64Array.from(rows, (row) => {
      const exposed = isExposed(row, spec, level);
      return exposed === null ? Number.NaN : Number(exposed);
    });
    const isReference = references.has(level);
    const asked = spec.slug === 'methodFamily' ? level === 'hot' : !(levels.length === 2 && spec.kind === 'nominal' && isReference);
    return column({ input: spec.slug, level }, spec, values, keys, { asked, candidate: spec.class !== 'lot' && spec.slug !== 'methodFamily' && !isReference });
  });
}

/** The commonest level of a nominal input (of the method: in each family); held things need none. */
function referencesAmong(levels: readonly string[], counts: ReadonlyMap<string, number>, spec: InputSpec, rows: readonly BatchRow[]): ReadonlySet<string> {
  if (spec.kind === 'held') return new Set();
  const commonest = (among: readonly string[]) => among.reduce<string | null>((best, level) => (best === null || counts.get(level)! > counts.get(best)! ? level : best), null);
  if (spec.slug !== 'method') return new Set([commonest(levels)].filter((level) => level !== null));
  const familyOf = new Map(rows.map((row) => [row.method, row.family]));
  return new Set((['cold', 'hot'] as const).map((family) => commonest(levels.filter((level) => familyOf.get(level) === family))).filter((level) => level !== null));
}

function column(term: Term, spec: InputSpec, values: Float64Array, keys: Keys, use: { asked: boolean; candidate: boolean }): Column {
  const isFlag = spec.kind !== 'number';
  const filled = fill(values, keys);
  const { within, spread } = centredWithin(filled, keys.hot);
  const plain = unit(centred(filled));
  const unitSpread = isFlag ? 1 : spread;
  const { code, codeValues } = encode(filled, isFlag ? 0 : mean(filled), unitSpread);
  const order = isFlag ? new Int32Array(0) : Int32Array.from(values.keys()).filter((i) => !Number.isNaN(values[i]!)).sort((a, b) => values[a]! - values[b]! || a - b);
  return { index: -1, term, spec, isFlag, values, order, code, codeValues, within, plain, spread: unitSpread, range: isFlag ? null : middleRange(values, keys.hot), ...use };
}

function mean(values: Float64Array): number {
  return values.length === 0 ? 0 : values.reduce((sum, value) => sum + value, 0) / values.length;
}

/** Missing values become the mean of the same maker and method (at least 4 batches), else of the method, else of all. */
function fill(values: Float64Array, { method, strata }: Keys): Float64Array {
  if (!values.some(Number.isNaN)) return values;
  const means = (codes: Int32Array, least: number) => {
    const size = codes.reduce((a, b) => Math.max(a, b), -1) + 1;
    const [sums, counts] = [new Float64Array(size), new Float64Array(size)];
    for (let i = 0; i < values.length; i++) {
      if (Number.isNaN(values[i]!)) continue;
      sums[codes[i]!]! += values[i]!;
      counts[codes[i]!]!++;
    }
    return sums.map((sum, k) => (counts[k]! >= least ? sum / counts[k]! : Number.NaN));
  };
  const [near, wide, all] = [means(strata, 4), means(method, 1), means(new Int32Array(values.length), 1)];
  return values.map((value, i) => [value, near[strata[i]!]!, wide[method[i]!]!, all[0] ?? 0, 0].find((candidate) => !Number.isNaN(candidate))!);
}

function centred(values: Float64Array): Float64Array {
  const middle = mean(values);
  return values.map((value) => value - middle);
}

function unit(values: Float64Array): Float64Array {
  const length = Math.sqrt(values.reduce((sum, value) => sum + value * value, 0));
  return length > 1e-9 * Math.sqrt(values.length + 1) ? values.map((value) => value / length) : new Float64Array(values.length);
}

function centredWithin(values: Float64Array, hot: Uint8Array): { within: Float64Array; spread: number } {
  const [sums, counts] = [new Float64Array(2), new Float64Array(2)];
  for (let i = 0; i < values.length; i++) {
    sums[hot[i]!]! += values[i]!;
    counts[hot[i]!]!++;
  }
  const about = values.map((value, i) => value - sums[hot[i]!]! / counts[hot[i]!]!);
  const df = values.length - (counts[0]! > 0 ? 1 : 0) - (counts[1]! > 0 ? 1 : 0);
  const spread = df > 0 ? Math.sqrt(about.reduce((sum, value) => sum + value * value, 0) / df) : 0;
  return { within: unit(about), spread };
}

function encode(filled: Float64Array, middle: number, spread: number): { code: Int32Array; codeValues: Float64Array } {
  const sorted = Float64Array.from(filled).sort();
  const scale = (value: number) => (spread > 0 ? (value - middle) / spread : 0);
  const distinct = [...new Set(sorted)];
  if (filled.length <= EXACT_NUMBERS_UP_TO || distinct.length <= BINS) {
    const index = new Map(distinct.map((value, i) => [value, i]));
    return { code: Int32Array.from(filled, (value) => index.get(value)!), codeValues: Float64Array.from(distinct, scale) };
  }
  const edges = Float64Array.from({ length: BINS - 1 }, (_, i) => quantileOf(sorted, (i + 1) / BINS));
  const code = Int32Array.from(filled, (value) => {
    let [low, high] = [0, BINS - 1];
    while (low < high) {
      const middleBin = (low + high) >> 1;
      if (value > edges[middleBin]!) low = middleBin + 1;
      else high = middleBin;
    }
    return low;
  });
  const [sums, counts] = [new Float64Array(BINS), new Float64Array(BINS)];
  for (let i = 0; i < filled.length; i++) {
    sums[code[i]!]! += filled[i]!;
    counts[code[i]!]!++;
  }
  return { code, codeValues: sums.map((sum, k) => (counts[k]! > 0 ? scale(sum / counts[k]!) : 0)) };
}

function middleRange(values: Float64Array, hot: Uint8Array): { low: number; high: number } | null {
  const of = (family: number) => values.filter((value, i) => hot[i] === family && !Number.isNaN(value)).sort();
  const [cold, warm] = [of(0), of(1)];
  const larger = cold.length >= warm.length ? cold : warm;
  return larger.length === 0 ? null : { low: quantileOf(larger, 0.1), high: quantileOf(larger, 0.9) };
}
