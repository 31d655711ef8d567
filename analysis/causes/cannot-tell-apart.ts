import { factorise, solveLower } from '#analysis/maths/cholesky.ts';
import type { Design } from '#analysis/maths/firth.ts';
import type { Term } from './board-rows.ts';
import type { CellCounts } from './counts.ts';
import type { Bench, Column } from './columns.ts';
import { correlation } from './adjust.ts';

/** From here on two inputs are one in this workshop's records (our rule). */
const TOO_ALIKE = 0.97;
/** Most the other inputs may blow up the variance of the asked one (our rule). */
export const MOST_INFLATION = 10;
const EACH_SIDE = 2;

/** Whether some stratum holds at least two exposed and two unexposed batches. */
function meets(counts: CellCounts, column: Column, stratum: Int32Array | null): boolean {
  const sides: [number, number][] = [];
  for (const i of counts.members) {
    const side = (sides[stratum?.[i] ?? 0] ??= [0, 0]);
    side[column.values[i]! > 0.5 ? 1 : 0]++;
  }
  return sides.some((side) => side !== undefined && side[0] >= EACH_SIDE && side[1] >= EACH_SIDE);
}

/** The one value all exposed members share, or null. */
function shared(counts: CellCounts, column: Column, valueOf: (i: number) => string): string | null {
  let only: string | null = null;
  for (const i of counts.members) {
    if (column.values[i]! <= 0.5) continue;
    const value = valueOf(i);
    if (only !== null && only !== value) return null;
    only = value;
  }
  return only;
}

/**
 * Partners an input level cannot be told from because the batches with it and
 * without it never meet: no method and maker has two of each.
 *
 * @returns empty when they do meet, or for numbers
 */
export function neverMeets(bench: Bench, counts: CellCounts, column: Column): Term[] {
  const { input } = column.term;
  if (!column.isFlag) return [];
  const askMethod = input === 'method' || input === 'methodFamily';
  if (meets(counts, column, askMethod ? bench.maker : input === 'maker' ? bench.method : bench.stratum)) return [];
  const apartByMethod = !askMethod && !meets(counts, column, bench.method);
  const apartByMaker = input !== 'maker' && !meets(counts, column, bench.maker);
  const neither = !apartByMethod && !apartByMaker;
  const partners: Term[] = [];
  if (!askMethod && (apartByMethod || neither)) partners.push({ input: 'method', level: shared(counts, column, (i) => bench.rows[i]!.method) });
  if (input !== 'maker' && (apartByMaker || neither)) partners.push({ input: 'maker', level: shared(counts, column, (i) => bench.rows[i]!.nominal['maker'] ?? '') || null });
  return partners;
}

/** Method family and maker when every exposed batch shares both: all that can be said stays inside them. */
export function confinedTo(bench: Bench, counts: CellCounts, column: Column): Term[] {
  const { input } = column.term;
  if (!column.isFlag || input === 'method' || input === 'methodFamily' || input === 'maker') return [];
  const family = shared(counts, column, (i) => bench.rows[i]!.family);
  const maker = shared(counts, column, (i) => bench.rows[i]!.nominal['maker'] ?? '');
  return family !== null && maker ? [{ input: 'methodFamily', level: family }, { input: 'maker', level: maker }] : [];
}

/** Inputs that move with the asked one in nearly every batch: |r| above 0.97, lots when they are always together. */
export function movesWith(bench: Bench, asked: Column, eligible: readonly Column[]): Term[] {
  const alike = eligible.filter((column) => Math.abs(correlation(bench, asked, column, 'plain')) > TOO_ALIKE);
  const lots = asked.spec.class !== 'lot' ? [] : bench.columns.filter((column) => column !== asked && column.spec.class === 'lot' && correlation(bench, asked, column, 'plain') > 1 - 1e-9);
  return [...alike, ...lots].map((column) => column.term);
}

/**
 * How much the other terms blow up the variance of term 1: 1 / (1 − R²) of it on the rest.
 *
 * @returns null when the rest determine it wholly
 */
export function varianceInflation(design: Design): number | null {
  const { groups, terms: p, x, weight } = design;
  const rest = p - 1;
  const gram = new Float64Array(rest * rest);
  const cross = new Float64Array(rest);
  let [total, sum, all] = [0, 0, 0];
  const other = (j: number) => (j === 0 ? 0 : j + 1);
  for (let i = 0, at = 0; i < groups; i++, at += p) {
    const w = weight[i]!;
    const asked = x[at + 1]!;
    total += w * asked * asked; sum += w * asked; all += w;
    for (let j = 0; j < rest; j++) {
      const wx = w * x[at + other(j)]!;
      cross[j]! += wx * asked;
      for (let k = 0; k <= j; k++) gram[j * rest + k]! += wx * x[at + other(k)]!;
    }
  }
  if (factorise(gram, rest) === null) return null;
  solveLower(gram, rest, cross);
  const left = total - cross.reduce((explained, part) => explained + part * part, 0);
  const variation = total - (sum * sum) / all;
  return left <= variation * 1e-9 ? null : variation / left;
}
