import type { Design } from '#analysis/maths/firth.ts';
import { EXACT_NUMBERS_UP_TO } from './columns.ts';
import type { Bench, Column } from './columns.ts';
import { OFFSET_STEP } from './lot-offsets.ts';

/** Numbers the rows of a cell so that equal ones share a number; codes are folded in one column at a time. */
class Grouping {
  readonly group: Int32Array;
  count: number;

  constructor(members: number) {
    this.group = new Int32Array(members);
    this.count = members > 0 ? 1 : 0;
  }

  fold(codes: (at: number) => number, levels: number): void {
    const span = this.count * levels;
    const seen = span <= 1 << 20 ? new Int32Array(span).fill(-1) : null;
    const sparse = seen ? null : new Map<number, number>();
    let next = 0;
    for (let at = 0; at < this.group.length; at++) {
      const key = this.group[at]! * levels + codes(at);
      let id = seen ? seen[key]! : (sparse!.get(key) ?? -1);
      if (id < 0) {
        id = next++;
        if (seen) seen[key] = id;
        else sparse!.set(key, id);
      }
      this.group[at] = id;
    }
    this.count = next;
  }
}

export interface CellTerms {
  asked: Column;
  /** The method family, unless it is asked about or only one is there. */
  withFamily: boolean;
  adjusters: readonly Column[];
  /** Log odds known beforehand, one a batch of the bench, a function of the lots it holds; null for none. */
  offset: Float64Array | null;
}

/**
 * The cell's batches as weighted groups of equal rows: term 0 the intercept, 1 the
 * asked input, then method family and adjusters.
 *
 * Groups come in the order of their first batch, so the digits do not depend on
 * how the rows arrived. Cost: O(members · terms).
 */
export function cellDesign(bench: Bench, members: Int32Array, outcome: Int8Array, terms: CellTerms): Design {
  const { asked, withFamily, adjusters, offset } = terms;
  const grouping = new Grouping(members.length);
  const columns = [asked, ...adjusters];
  for (const column of columns) grouping.fold((at) => column.code[members[at]!]!, column.codeValues.length);
  if (withFamily) grouping.fold((at) => bench.hot[members[at]!]!, 2);
  if (offset) foldOffset(grouping, bench, members, offset);

  const p = 2 + (withFamily ? 1 : 0) + adjusters.length;
  const design: Design = {
    groups: grouping.count, terms: p, x: new Float64Array(grouping.count * p),
    weight: new Float64Array(grouping.count), found: new Float64Array(grouping.count), offset: new Float64Array(grouping.count),
  };
  for (let at = 0; at < members.length; at++) {
    const group = grouping.group[at]!;
    const i = members[at]!;
    if (design.weight[group] === 0) {
      let term = group * p;
      design.x[term++] = 1;
      design.x[term++] = asked.codeValues[asked.code[i]!]!;
      if (withFamily) design.x[term++] = bench.hot[i]!;
      for (const column of adjusters) design.x[term++] = column.codeValues[column.code[i]!]!;
      design.offset[group] = offset ? offset[i]! : 0;
    }
    design.weight[group]!++;
    if (outcome[i]! > 0) design.found[group]!++;
  }
  return design;
}

/** Small workshops keep sets of lots apart; large ones have their offsets in whole steps, which collapse further. */
function foldOffset(grouping: Grouping, bench: Bench, members: Int32Array, offset: Float64Array): void {
  if (bench.n <= EXACT_NUMBERS_UP_TO) {
    const sets = 1 + bench.lotSet.reduce((a, b) => Math.max(a, b), 0);
    grouping.fold((at) => bench.lotSet[members[at]!]!, sets);
    return;
  }
  let [lowest, highest] = [Infinity, -Infinity];
  for (const i of members) {
    lowest = Math.min(lowest, offset[i]!);
    highest = Math.max(highest, offset[i]!);
  }
  if (members.length > 0) grouping.fold((at) => Math.round((offset[members[at]!]! - lowest) / OFFSET_STEP), Math.round((highest - lowest) / OFFSET_STEP) + 1);
}
