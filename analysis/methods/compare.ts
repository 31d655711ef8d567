import type { BatchRow, BoardCell, CellGrade, LeftOut } from '#analysis/causes/board-rows.ts';
import { reasonLeftOut, tally } from '#analysis/causes/columns.ts';
import { byText, nominalValue } from '#analysis/causes/exposure.ts';
import { differenceOf } from '#analysis/intervals/newcombe-difference.ts';
import type { DifferenceInterval } from '#analysis/intervals/newcombe-difference.ts';
import { wilsonOrNone } from '#analysis/intervals/wilson-interval.ts';
import type { ShareInterval } from '#analysis/intervals/wilson-interval.ts';
import { standardise } from './standardise.ts';
import type { StratumCounts } from './standardise.ts';

/** One fault in one method family. */
export interface FamilyRate {
  n: number;
  events: number;
  raw: ShareInterval | null;
  /** As it would be if both families had the workshop's own mix; null where they never met. */
  standardised: ShareInterval | null;
}

/** A stratum where only one family was made, so that nothing can be compared in it. */
export interface WhereTheyNeverMet {
  /** Values of the inputs stood by, such as `{ maker: 'priya' }`; null when not recorded. */
  stratum: Readonly<Record<string, string | null>>;
  hotN: number;
  coldN: number;
}

export interface FaultComparison {
  fault: string;
  hot: FamilyRate;
  cold: FamilyRate;
  notChecked: number;
  /** Hot minus cold, as counted. */
  difference: DifferenceInterval | null;
  /** Hot minus cold with the same mix. */
  standardisedDifference: DifferenceInterval | null;
  neverMet: readonly WhereTheyNeverMet[];
  grade: CellGrade;
  /** The board's answer for the method family, which also holds what else moved still; null without a board. */
  cell: BoardCell | null;
}

export interface MethodComparison {
  by: readonly string[];
  batches: { hot: number; cold: number };
  leftOut: readonly LeftOut[];
  faults: readonly FaultComparison[];
  method: 'direct-standardisation';
}

export interface ComparisonQuestion {
  rows: readonly BatchRow[];
  faults: readonly string[];
  /** Nominal inputs whose mix both families are given; the maker when absent. */
  by?: readonly string[];
  /** The board's cells; without them no grade is given (`too-few`). */
  cells: readonly BoardCell[];
}

/**
 * Hot against cold, fault by fault: as counted, and with the same mix of makers (or what else is asked).
 *
 * @returns faults in the order given
 *
 * Source: Newcombe 1998 for the raw difference, direct standardisation for the fair one. Cost: O(faults · rows).
 */
export function compareMethods({ rows, faults, by = ['maker'], cells }: ComparisonQuestion): MethodComparison {
  const counting = rows.filter((row) => reasonLeftOut(row) === null).sort((a, b) => byText(a.id, b.id));
  const own = new Map(cells.filter((cell) => cell.input === 'methodFamily').map((cell) => [cell.fault, cell]));
  const hot = counting.filter((row) => row.family === 'hot').length;
  return {
    by, batches: { hot, cold: counting.length - hot },
    leftOut: tally(rows.flatMap((row) => reasonLeftOut(row) ?? [])),
    faults: faults.map((fault) => compareFault(counting, fault, by, own.get(fault) ?? null)),
    method: 'direct-standardisation',
  };
}

interface Stratum extends StratumCounts { values: Record<string, string | null> }

function strataOf(rows: readonly BatchRow[], fault: string, by: readonly string[]): Stratum[] {
  const strata = new Map<string, Stratum>();
  for (const row of rows) {
    const outcome = row.outcomes[fault];
    if (outcome === undefined) continue;
    const values = Object.fromEntries(by.map((input) => [input, nominalValue(row, input)]));
    const key = JSON.stringify(values);
    const stratum = strata.get(key) ?? { values, n1: 0, events1: 0, n0: 0, events0: 0 };
    stratum[row.family === 'hot' ? 'n1' : 'n0']++;
    if (outcome > 0) stratum[row.family === 'hot' ? 'events1' : 'events0']++;
    strata.set(key, stratum);
  }
  return [...strata].sort(([a], [b]) => byText(a, b)).map(([, stratum]) => stratum);
}

function compareFault(rows: readonly BatchRow[], fault: string, by: readonly string[], cell: BoardCell | null): FaultComparison {
  const strata = strataOf(rows, fault, by);
  const total = (of: keyof StratumCounts) => strata.reduce((sum, stratum) => sum + stratum[of], 0);
  const [hotN, hotEvents, coldN, coldEvents] = [total('n1'), total('events1'), total('n0'), total('events0')];
  const fair = standardise(strata);
  const [rawHot, rawCold] = [wilsonOrNone(hotEvents, hotN), wilsonOrNone(coldEvents, coldN)];
  const [fairHot, fairCold] = fair.kind === 'answer' ? [fair.one, fair.other] : [null, null];
  return {
    fault,
    hot: { n: hotN, events: hotEvents, raw: rawHot, standardised: fairHot },
    cold: { n: coldN, events: coldEvents, raw: rawCold, standardised: fairCold },
    notChecked: rows.length - hotN - coldN,
    difference: rawHot && rawCold ? differenceOf(rawHot, rawCold) : null,
    standardisedDifference: fairHot && fairCold ? differenceOf(fairHot, fairCold) : null,
    neverMet: fair.neverMet.map((i) => ({ stratum: strata[i]!.values, hotN: strata[i]!.n1, coldN: strata[i]!.n0 })),
    grade: cell?.grade ?? 'too-few', cell,
  };
}
