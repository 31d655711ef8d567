import { Z95 } from '#analysis/maths/distributions.ts';
import { firthFit, standardError } from '#analysis/maths/firth.ts';
import { oddsRatio } from '#analysis/tables/fisher.ts';
import type { TwoByTwo } from '#analysis/tables/two-by-two.ts';
import type { Bench, Column } from './columns.ts';
import type { CellCounts } from './counts.ts';
import { ASKED } from './fit-cell.ts';
import { cellDesign } from './cell-design.ts';

/** A stratum with fewer checked batches has no say of its own. */
const HAS_A_SAY = 8;

export interface Stratum {
  method: string;
  maker: string | null;
  members: Int32Array;
  table: TwoByTwo;
}

/** The cell's batches by method and maker, in the order of their names. */
export function strataOf(bench: Bench, counts: CellCounts, column: Column, outcome: Int8Array): Stratum[] {
  const groups = new Map<number, number[]>();
  for (const i of counts.members) {
    const key = bench.stratum[i]!;
    const group = groups.get(key);
    if (group) group.push(i);
    else groups.set(key, [i]);
  }
  return [...groups].sort(([a], [b]) => a - b).map(([, members]) => {
    const table = { exposedFound: 0, exposedClear: 0, unexposedFound: 0, unexposedClear: 0 };
    for (const i of members) {
      const exposed = column.values[i]! > (counts.above ?? 0.5);
      const found = outcome[i]! > 0;
      table[exposed ? (found ? 'exposedFound' : 'exposedClear') : found ? 'unexposedFound' : 'unexposedClear']++;
    }
    const row = bench.rows[members[0]!]!;
    return { method: row.method, maker: row.nominal['maker'] ?? null, members: Int32Array.from(members), table };
  });
}

/** Whether a stratum of at least 8 checked batches points clearly (its own interval excludes 1) the other way. */
export function somePointBack(bench: Bench, counts: CellCounts, column: Column, outcome: Int8Array, logOdds: number): boolean {
  return strataOf(bench, counts, column, outcome).some(({ members, table }) => {
    if (members.length < HAS_A_SAY) return false;
    const { lower, upper } = column.isFlag ? logEnds(oddsRatio(table)) : slopeEnds(bench, members, column, outcome);
    return logOdds > 0 ? upper !== null && upper < 0 : lower !== null && lower > 0;
  });
}

function logEnds({ lower, upper }: { lower: number | null; upper: number | null }): { lower: number | null; upper: number | null } {
  return { lower: lower === null || lower === 0 ? null : Math.log(lower), upper: upper === null ? null : Math.log(upper) };
}

function slopeEnds(bench: Bench, members: Int32Array, column: Column, outcome: Int8Array): { lower: number | null; upper: number | null } {
  const design = cellDesign(bench, members, outcome, { asked: column, withFamily: false, adjusters: [], offset: null });
  const fit = firthFit(design);
  if (fit === null || !fit.converged) return { lower: null, upper: null };
  const half = Z95 * standardError(fit, ASKED);
  return { lower: fit.beta[ASKED]! - half, upper: fit.beta[ASKED]! + half };
}
