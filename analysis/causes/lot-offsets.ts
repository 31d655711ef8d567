import { factorise, solveWith } from '#analysis/maths/cholesky.ts';
import { EXACT_NUMBERS_UP_TO } from './columns.ts';
import type { Column } from './columns.ts';

/** Shrunken log odds of each lot column for one fault, everything else held. */
export type LotEffects = ReadonlyMap<Column, number>;

/** A lot on fewer batches says next to nothing once shrunk; beyond 200 lots the most used ones are taken, for speed. */
const LEAST_BATCHES = 3;
const MOST_LOTS = 200;

/** Prior variances of the log odds (our rule): method 9, each lot 1, all else 0.25 on its standardised value. */
const METHOD_VARIANCE = 9;
const LOT_VARIANCE = 1;
/** A kind of lot the trade does not suspect of the fault gets less: it is mostly a period of the calendar, and would take from the lot to blame. */
const UNSUSPECTED_LOT_VARIANCE = 0.05;
const TERM_VARIANCE = 0.25;

/** In a large workshop a lot's effect is rounded to this, so that equal rows collapse; it is far below its uncertainty. */
export const OFFSET_STEP = 0.05;

/** The batches once as sparse rows, for all faults. */
export interface SparseRows {
  columns: readonly Column[];
  isLot: readonly boolean[];
  precision: Float64Array;
  start: Int32Array;
  term: Int32Array;
  value: Float64Array;
}

/** Chooses the terms and writes each batch as its non-zero ones; term 0 is the intercept, term 1 the hot family. */
export function sparseRows(columns: readonly Column[], hot: Uint8Array): SparseRows {
  const count = (column: Column) => column.values.reduce((sum, value) => sum + (value === 1 ? 1 : 0), 0);
  const lots = columns.filter((column) => column.spec.class === 'lot' && column.isFlag)
    .map((column, i) => ({ column, used: count(column), i })).filter(({ used }) => used >= LEAST_BATCHES)
    .sort((a, b) => b.used - a.used || a.i - b.i).slice(0, MOST_LOTS).map(({ column }) => column);
  const used = [...columns.filter((column) => column.candidate), ...lots];
  const isLot = used.map((column) => column.spec.class === 'lot');
  const precision = Float64Array.from([0, 1 / METHOD_VARIANCE, ...used.map((column, i) => (isLot[i] ? 1 / LOT_VARIANCE : variance(column) / TERM_VARIANCE))]);
  const start = new Int32Array(hot.length + 1);
  const term: number[] = [];
  const value: number[] = [];
  for (let i = 0; i < hot.length; i++) {
    term.push(0); value.push(1);
    if (hot[i]) { term.push(1); value.push(1); }
    for (const [j, column] of used.entries()) {
      const x = column.codeValues[column.code[i]!]!;
      if (x !== 0) { term.push(j + 2); value.push(x); }
    }
    start[i + 1] = term.length;
  }
  return { columns: used, isLot, precision, start, term: Int32Array.from(term), value: Float64Array.from(value) };
}

function variance(column: Column): number {
  const n = column.code.length;
  let [sum, squares] = [0, 0];
  for (const code of column.code) {
    sum += column.codeValues[code]!;
    squares += column.codeValues[code]! ** 2;
  }
  return Math.max(squares / n - (sum / n) ** 2, 1e-6);
}

/**
 * One ridge logistic model per fault with everything in it; what it gives a lot is
 * then known ground (an offset) when another input is asked about.
 *
 * @param outcome 1 found, 0 clear, −1 not checked, one a batch
 * @param allowed whether a term may take part: known in time and not come about by itself
 * @param suspected whether the trade names a lot of this kind among the usual suspects of the fault
 *
 * Source: ridge logistic regression, S. le Cessie and H. van Houwelingen, Appl. Stat. 41 (1992) 191; prior variances are our rule.
 * Cost: O(checked · non-zero²  + terms³) a Newton step.
 */
export function lotEffects(rows: SparseRows, outcome: Int8Array, allowed: (column: Column) => boolean, suspected: (column: Column) => boolean): LotEffects {
  const precision = rows.precision.map((own, term) => (rows.isLot[term - 2] && !suspected(rows.columns[term - 2]!) ? 1 / UNSUSPECTED_LOT_VARIANCE : own));
  const active = [0, 1, ...rows.columns.flatMap((column, j) => (allowed(column) ? [j + 2] : []))];
  const index = new Int32Array(rows.columns.length + 2).fill(-1);
  for (const [k, term] of active.entries()) index[term] = k;
  const p = active.length;
  const beta = new Float64Array(p);
  const effects = new Map<Column, number>();
  if (rows.isLot.some((isLot, j) => isLot && index[j + 2]! >= 0)) climb({ ...rows, precision }, outcome, active, index, beta);
  for (const [j, column] of rows.columns.entries()) if (rows.isLot[j] && index[j + 2]! >= 0) {
    const effect = beta[index[j + 2]!]!;
    effects.set(column, outcome.length > EXACT_NUMBERS_UP_TO ? Math.round(effect / OFFSET_STEP) * OFFSET_STEP : effect);
  }
  return effects;
}

function climb(rows: SparseRows, outcome: Int8Array, active: readonly number[], index: Int32Array, beta: Float64Array): void {
  const p = active.length;
  const information = new Float64Array(p * p);
  const score = new Float64Array(p);
  const [found, clear] = [outcome.reduce((sum, y) => sum + (y > 0 ? 1 : 0), 0), outcome.reduce((sum, y) => sum + (y === 0 ? 1 : 0), 0)];
  beta[0] = Math.log((found + 0.5) / (clear + 0.5));
  for (let round = 0; round < 25; round++) {
    gather(rows, outcome, index, beta, information, score, p);
    for (const [k, term] of active.entries()) {
      information[k * p + k]! += rows.precision[term]! + 1e-9;
      score[k]! -= rows.precision[term]! * beta[k]!;
    }
    if (factorise(information, p) === null) return;
    solveWith(information, p, score);
    const largest = score.reduce((most, part) => Math.max(most, Math.abs(part)), 0);
    // The ridge keeps the surface smooth; a cap on the step is all the care it needs.
    const share = Math.min(1, 2 / largest);
    for (let k = 0; k < p; k++) beta[k]! += share * score[k]!;
    if (largest < 1e-3) return;
  }
}

function gather(rows: SparseRows, outcome: Int8Array, index: Int32Array, beta: Float64Array, information: Float64Array, score: Float64Array, p: number): void {
  const { start, term, value } = rows;
  information.fill(0);
  score.fill(0);
  const place = new Int32Array(index.length);
  const amount = new Float64Array(index.length);
  for (let i = 0; i < outcome.length; i++) {
    if (outcome[i]! < 0) continue;
    let eta = 0;
    let used = 0;
    for (let at = start[i]!; at < start[i + 1]!; at++) {
      const k = index[term[at]!]!;
      if (k < 0) continue;
      place[used] = k;
      amount[used++] = value[at]!;
      eta += beta[k]! * value[at]!;
    }
    const probability = 1 / (1 + Math.exp(-eta));
    const weight = probability * (1 - probability);
    const residual = outcome[i]! - probability;
    for (let a = 0; a < used; a++) {
      const wx = weight * amount[a]!;
      score[place[a]!]! += residual * amount[a]!;
      const rowAt = place[a]! * p;
      for (let b = 0; b <= a; b++) information[rowAt + place[b]!]! += wx * amount[b]!;
    }
  }
}
