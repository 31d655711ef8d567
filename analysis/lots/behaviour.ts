import type { BatchRow, BoardCell, CellGrade, LeftOut } from '#analysis/causes/board-rows.ts';
import { reasonLeftOut, tally } from '#analysis/causes/columns.ts';
import { byText } from '#analysis/causes/exposure.ts';
import { wilsonOrNone } from '#analysis/intervals/wilson-interval.ts';
import type { ShareInterval } from '#analysis/intervals/wilson-interval.ts';
import { againstPeers, talliesOf } from './expected-rate.ts';
import type { AgainstPeers } from './expected-rate.ts';
import { priorFromLots, shrunkRatio } from './shrink.ts';
import { suggestStanding } from './standing.ts';
import type { StandingReason, SuggestedStanding } from './standing.ts';

/** `disagrees`: the counts accuse the lot, the board, which knows what else moved with it, does not. */
export const LOT_VERDICTS = ['misbehaves', 'watch', 'disagrees', 'too-few', 'as-its-peers'] as const;
export type LotVerdict = (typeof LOT_VERDICTS)[number];

/** A lot and one fault, over some of its batches. */
export interface LotRate {
  n: number;
  events: number;
  notChecked: number;
  /** As counted, with Wilson's interval. */
  rate: ShareInterval | null;
  /** Found at its peers' rates, in batches, and as a share. */
  expected: number;
  expectedRate: number | null;
  /** Shrunken rate ratio against its peers. */
  ratio: { mean: number; lower: number; upper: number } | null;
  /** P(at least twice as bad as its peers). */
  chanceTwice: number | null;
  /** Expected rate times the shrunken ratio, at most 1. */
  shownRate: number | null;
  verdict: LotVerdict;
}

export interface LotFault {
  fault: string;
  verdict: LotVerdict;
  all: LotRate;
  cold: LotRate;
  hot: LotRate;
  /** Shape of the Gamma prior, from all lots of this kind for this fault. */
  prior: number;
  boardGrade: CellGrade | null;
}

export interface LotBehaviour {
  lot: string;
  /** Batches that hold it and count. */
  n: number;
  families: { cold: { batches: number }; hot: { batches: number } };
  leftOut: readonly LeftOut[];
  faults: readonly LotFault[];
  /** The gravest of its faults' verdicts. */
  verdict: LotVerdict;
  suggestedStanding: SuggestedStanding | null;
  because: readonly StandingReason[];
  method: 'gamma-poisson';
}

export interface BehaviourQuestion {
  rows: readonly BatchRow[];
  /** Slug of the held input, such as `fragranceLot`. */
  lotInput: string;
  faults: readonly string[];
  /** The board's cells; without them verdicts rest on counts alone. */
  cells: readonly BoardCell[];
}

/**
 * How each lot of a kind behaves against its peers, fault by fault, hot against cold.
 *
 * A verdict needs counts and board to agree (our rule): misbehaves when the chance of
 * being twice as bad is at least 0.9 with 3 found, watch from 0.8 with 2.
 *
 * @returns one answer a lot, in the order of their ids; none when no batch holds any
 *
 * Source: Gamma-Poisson shrinkage, DuMouchel 1999; Norén, Hopstadius & Bate 2013. Cost: O(faults · rows).
 */
export function lotsBehaviour({ rows, lotInput, faults, cells }: BehaviourQuestion): LotBehaviour[] {
  const held = [...rows].sort((a, b) => byText(a.id, b.id));
  const counting = held.filter((row) => reasonLeftOut(row) === null);
  const lots = new Map<string, BatchRow[]>();
  for (const row of counting) {
    for (const lot of new Set(row.holds[lotInput] ?? [])) {
      const own = lots.get(lot);
      if (own) own.push(row);
      else lots.set(lot, [row]);
    }
  }
  const ids = [...lots.keys()].sort(byText);
  const grades = new Map(cells.filter((cell) => cell.input === lotInput && cell.level !== null).map((cell) => [`${cell.fault}\n${cell.level}`, cell]));
  const sizes = new Map(ids.map((lot) => [lot, sizesOf(lots.get(lot)!)]));
  const byLot = new Map<string, LotFault[]>(ids.map((lot) => [lot, []]));
  for (const fault of faults) {
    const peers = talliesOf(counting, fault);
    const counts = ids.map((lot) => againstPeers(peers, lots.get(lot)!, fault));
    const prior = priorFromLots(counts.map(({ all }) => all));
    for (const [i, lot] of ids.entries()) byLot.get(lot)!.push(faultOf(counts[i]!, sizes.get(lot)!, fault, prior, grades.get(`${fault}\n${lot}`) ?? null, cells.length > 0));
  }
  return ids.map((lot) => {
    const own = lots.get(lot)!;
    const answers = byLot.get(lot)!;
    return {
      lot, n: own.length,
      families: { cold: { batches: sizes.get(lot)!.cold }, hot: { batches: sizes.get(lot)!.hot } },
      leftOut: tally(held.filter((row) => row.holds[lotInput]?.includes(lot)).flatMap((row) => reasonLeftOut(row) ?? [])),
      faults: answers, verdict: gravest(answers.map((answer) => answer.verdict)),
      ...suggestStanding(answers), method: 'gamma-poisson',
    };
  });
}

function gravest(verdicts: readonly LotVerdict[]): LotVerdict {
  return LOT_VERDICTS.find((verdict) => verdicts.includes(verdict)) ?? 'too-few';
}

interface Sizes { all: number; cold: number; hot: number }

function sizesOf(own: readonly BatchRow[]): Sizes {
  const hot = own.reduce((sum, row) => sum + (row.family === 'hot' ? 1 : 0), 0);
  return { all: own.length, cold: own.length - hot, hot };
}

function faultOf(counts: Record<keyof Sizes, AgainstPeers>, sizes: Sizes, fault: string, prior: number, cell: BoardCell | null, boardAsked: boolean): LotFault {
  const agrees = !boardAsked || (cell !== null && ['settled', 'likely', 'hint'].includes(cell.grade) && cell.direction === 'more');
  const of = (part: keyof Sizes) => rateOf(counts[part], sizes[part], prior, agrees);
  const all = of('all');
  return { fault, verdict: all.verdict, all, cold: of('cold'), hot: of('hot'), prior, boardGrade: cell?.grade ?? null };
}

function rateOf({ n, found, expected }: AgainstPeers, batches: number, prior: number, agrees: boolean): LotRate {
  const base = { n, events: found, notChecked: batches - n, rate: wilsonOrNone(found, n), expected };
  if (n === 0) return { ...base, expectedRate: null, ratio: null, chanceTwice: null, shownRate: null, verdict: 'too-few' };
  const { mean, lower, upper, chanceTwice } = shrunkRatio(found, expected, prior);
  return {
    ...base, expectedRate: expected / n, ratio: { mean, lower, upper }, chanceTwice,
    shownRate: Math.min(1, (expected / n) * mean), verdict: verdictOf(found, chanceTwice, lower, upper, agrees),
  };
}

function verdictOf(events: number, chanceTwice: number, lower: number, upper: number, agrees: boolean): LotVerdict {
  if (chanceTwice >= 0.9 && events >= 3) return agrees ? 'misbehaves' : 'disagrees';
  if (chanceTwice >= 0.8 && events >= 2) return agrees ? 'watch' : 'disagrees';
  return lower > 0.5 && upper < 2 ? 'as-its-peers' : 'too-few';
}
