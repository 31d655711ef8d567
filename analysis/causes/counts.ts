import type { TwoByTwo } from '#analysis/tables/two-by-two.ts';
import type { Bench, Column } from './columns.ts';

/** The batches of one cell: those checked for the fault whose record says about the input. */
export interface CellCounts {
  /** Positions in the bench's rows. */
  members: Int32Array;
  table: TwoByTwo;
  n: number;
  events: number;
  notChecked: number;
  noValue: number;
  /** Numbers: the median of the members, above which a batch counts as exposed. */
  above: number | null;
}

/** Counts one cell. Cost: O(batches). */
export function countCell(bench: Bench, column: Column, outcome: Int8Array): CellCounts {
  const members = new Int32Array(bench.n);
  let [n, notChecked, noValue] = [0, 0, 0];
  for (let i = 0; i < bench.n; i++) {
    if (Number.isNaN(column.values[i]!)) noValue++;
    else if (outcome[i]! < 0) notChecked++;
    else members[n++] = i;
  }
  const own = members.subarray(0, n);
  const above = column.isFlag || n === 0 ? null : medianOf(column, outcome, n);
  const [found, clear] = [[0, 0], [0, 0]] as [[number, number], [number, number]];
  for (const i of own) {
    const exposed = column.values[i]! > (above ?? 0.5) ? 1 : 0;
    if (outcome[i]! > 0) found[exposed]++;
    else clear[exposed]++;
  }
  const table = { exposedFound: found[1], exposedClear: clear[1], unexposedFound: found[0], unexposedClear: clear[0] };
  return { members: own, table, n, events: found[0] + found[1], notChecked, noValue, above };
}

/** Median of a number over its checked batches; walks the order made once, since sorting for each fault is what would cost. */
function medianOf(column: Column, outcome: Int8Array, n: number): number {
  const upper = n >> 1;
  let seen = 0;
  let before = 0;
  for (const i of column.order) {
    if (outcome[i]! < 0) continue;
    if (seen === upper) return n % 2 === 1 ? column.values[i]! : (before + column.values[i]!) / 2;
    before = column.values[i]!;
    seen++;
  }
  return before;
}
