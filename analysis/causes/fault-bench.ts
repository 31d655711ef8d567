import type { FaultSpec } from './board-rows.ts';
import type { Bench, Column } from './columns.ts';
import { lotEffects } from './lot-offsets.ts';
import type { LotEffects, SparseRows } from './lot-offsets.ts';
import { arisesByItself, comesAfter, onThePath } from './what-comes-first.ts';

/** One fault over the bench: outcomes, and what all its cells share. */
export interface FaultBench {
  fault: FaultSpec;
  /** 1 found, 0 clear, −1 not checked. */
  outcome: Int8Array;
  checked: number;
  events: number;
  /** Correlation of a column with the fault among checked batches, given the method family or plain. */
  withFault: (column: Column, given: 'within' | 'plain') => number;
  /** Sum of the shrunken effects of each batch's lots. */
  offset: Float64Array;
  effects: LotEffects;
}

/** Outcomes of one fault, in the order of the bench. */
export function outcomesOf(bench: Bench, fault: string): Int8Array {
  return Int8Array.from(bench.rows, (row) => {
    const outcome = row.outcomes[fault];
    return outcome === undefined ? -1 : outcome > 0 ? 1 : 0;
  });
}

/** Below so many found or clear no cell can be decided, and the shared model is not fitted. */
const DECIDABLE = 3;

export function faultBench(bench: Bench, sparse: SparseRows, fault: FaultSpec): FaultBench {
  const outcome = outcomesOf(bench, fault.slug);
  let [checked, events] = [0, 0];
  for (const value of outcome) {
    if (value >= 0) checked++;
    if (value > 0) events++;
  }
  const decidable = Math.min(events, checked - events) >= DECIDABLE;
  const effects: LotEffects = decidable ? lotEffects(sparse, outcome, (column) => takesPart(column, fault), (column) => fault.suspects.some(({ input }) => input === column.term.input)) : new Map();
  const offset = new Float64Array(bench.n);
  for (const [column, effect] of effects) for (let i = 0; i < bench.n; i++) if (column.values[i] === 1) offset[i]! += effect;
  return { fault, outcome, checked, events, withFault: correlationWithFault(bench, outcome), offset, effects };
}

/** What lies between a lot and the fault would take the lot's effect away from it. */
function takesPart(column: Column, fault: FaultSpec): boolean {
  return !arisesByItself(column.term.input) && !onThePath(column.term.input, 'fragranceLot', fault.slug) && !comesAfter(column.spec.knownAt, fault.slug, fault.firstSeen);
}

function correlationWithFault(bench: Bench, outcome: Int8Array): FaultBench['withFault'] {
  const memo = { within: new Map<Column, number>(), plain: new Map<Column, number>() };
  const residual = { within: centredOutcome(bench.hot, outcome), plain: centredOutcome(new Uint8Array(bench.n), outcome) };
  return (column, given) => {
    let value = memo[given].get(column);
    if (value === undefined) {
      value = correlate(column[given], residual[given], given === 'within' ? bench.hot : new Uint8Array(bench.n), outcome);
      memo[given].set(column, value);
    }
    return value;
  };
}

function centredOutcome(stratum: Uint8Array, outcome: Int8Array): Float64Array {
  const [sums, counts] = [new Float64Array(2), new Float64Array(2)];
  for (let i = 0; i < outcome.length; i++) {
    if (outcome[i]! < 0) continue;
    sums[stratum[i]!]! += outcome[i]!;
    counts[stratum[i]!]!++;
  }
  return Float64Array.from(outcome, (value, i) => (value < 0 ? 0 : value - sums[stratum[i]!]! / counts[stratum[i]!]!));
}

function correlate(x: Float64Array, residual: Float64Array, stratum: Uint8Array, outcome: Int8Array): number {
  const [sums, squares, counts] = [new Float64Array(2), new Float64Array(2), new Float64Array(2)];
  let [cross, spread] = [0, 0];
  for (let i = 0; i < x.length; i++) {
    if (outcome[i]! < 0) continue;
    const s = stratum[i]!;
    sums[s]! += x[i]!;
    squares[s]! += x[i]! * x[i]!;
    counts[s]!++;
    cross += x[i]! * residual[i]!;
    spread += residual[i]! * residual[i]!;
  }
  let own = 0;
  for (let s = 0; s < 2; s++) if (counts[s]! > 0) own += squares[s]! - (sums[s]! * sums[s]!) / counts[s]!;
  return own > 1e-12 && spread > 1e-12 ? cross / Math.sqrt(own * spread) : 0;
}
