import type { FaultSpec } from './board-rows.ts';
import type { Bench, Column } from './columns.ts';
import { byText } from './exposure.ts';
import { arisesByItself, comesAfter, isSameQuantity, momentOrder, onThePath } from './what-comes-first.ts';

/** At most so many adjusters, whatever the data would carry (our rule). */
const MOST_ADJUSTERS = 10;
/** A candidate whose two correlations multiply to less can hardly confound (our rule). */
const LEAST_PRODUCT = 0.01;

/** Correlation of two columns over all batches that count, given the method family or plain; computed once a pair. */
export function correlation(bench: Bench, one: Column, other: Column, given: 'within' | 'plain'): number {
  const kept = bench.correlations[given];
  const at = Math.min(one.index, other.index) * bench.columns.length + Math.max(one.index, other.index);
  if (Number.isNaN(kept[at]!)) kept[at] = dot(one[given], other[given]);
  return kept[at]!;
}

function dot(one: Float64Array, other: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < one.length; i++) sum += one[i]! * other[i]!;
  return sum;
}

export interface Candidates {
  eligible: readonly Column[];
  /** Inputs that could have been adjusted for but lie between the asked input and the fault. */
  onThePath: readonly string[];
}

/** Of one held input two things may confound each other; of one nominal input the other levels are the comparison itself. */
function isTheSame(asked: Column, other: Column): boolean {
  if (asked.term.input === other.term.input && asked.spec.kind === 'held') return asked.term.level === other.term.level;
  return isSameQuantity(asked.term.input, other.term.input);
}

/**
 * What may be adjusted for when one input is asked about: common causes only.
 *
 * Known no later than the asked input, or set independently of it; not between it
 * and the fault; not the same quantity; and able to come before the fault at all.
 */
export function candidatesFor(asked: Column, columns: readonly Column[], fault: FaultSpec): Candidates {
  const between = new Set<string>();
  const eligible = columns.filter((column) => {
    if (!column.candidate || isTheSame(asked, column)) return false;
    if (comesAfter(column.spec.knownAt, fault.slug, fault.firstSeen)) return false;
    if (onThePath(column.term.input, asked.term.input, fault.slug)) {
      between.add(column.term.input);
      return false;
    }
    return !arisesByItself(column.term.input) || momentOrder(column.spec.knownAt) <= momentOrder(asked.spec.knownAt);
  });
  return { eligible, onThePath: [...between].sort(byText) };
}

/**
 * The adjusters, strongest first: by the product of the correlations with the
 * asked input and with the fault, both given the method family.
 *
 * @param withFault correlation of a column with the fault among checked batches
 * @param rarer the smaller of found and clear: ten of it carry one adjuster
 */
export function chooseAdjusters(bench: Bench, asked: Column, eligible: readonly Column[], withFault: (column: Column) => number, rarer: number): Column[] {
  const most = Math.min(MOST_ADJUSTERS, Math.floor(rarer / 10));
  if (most === 0) return [];
  const given = asked.term.input === 'methodFamily' ? 'plain' : 'within';
  return eligible
    .map((column, i) => ({ column, i, product: Math.abs(correlation(bench, asked, column, given) * withFault(column)) }))
    .filter(({ product }) => product >= LEAST_PRODUCT)
    .sort((a, b) => b.product - a.product || a.i - b.i)
    .slice(0, most)
    .map(({ column }) => column);
}
