import { wilsonInterval, wilsonOrNone } from '#analysis/intervals/wilson-interval.ts';
import type { ShareInterval } from '#analysis/intervals/wilson-interval.ts';
import { breslowDay } from '#analysis/tables/breslow-day.ts';
import { mantelHaenszel } from '#analysis/tables/mantel-haenszel.ts';
import { designFor, spreadsInRange } from './ask-cell.ts';
import type { BoardCell, Estimate, Term } from './board-rows.ts';
import { causesBoard } from './board.ts';
import type { BoardQuestion } from './board.ts';
import { layOut } from './columns.ts';
import type { Bench, Column } from './columns.ts';
import { countCell } from './counts.ts';
import type { CellCounts } from './counts.ts';
import { faultBench } from './fault-bench.ts';
import { asOddsRatio, fitCell } from './fit-cell.ts';
import { leaveOneOutRange } from './leave-one-out.ts';
import { sparseRows } from './lot-offsets.ts';
import { strataOf } from './strata.ts';

export interface StratumView {
  method: string;
  maker: string | null;
  exposedN: number;
  exposedEvents: number;
  unexposedN: number;
  unexposedEvents: number;
  exposedRate: ShareInterval | null;
  unexposedRate: ShareInterval | null;
}

/** Checked batches of a number between two values, both included. */
export interface ValueBin extends ShareInterval {
  from: number;
  to: number;
  n: number;
  events: number;
}

/** One cell of the board opened. */
export interface CauseDetail {
  cell: BoardCell;
  strata: readonly StratumView[];
  /** Over the strata, each compared with itself only; null for numbers and where nothing meets. */
  mantelHaenszel: Estimate | null;
  /** P that one odds ratio fits all strata; below 0.1 the strata are to be shown apart. */
  homogeneityP: number | null;
  differs: boolean;
  /** The odds ratio without each adjuster in turn. */
  without: readonly (Estimate & { term: Term })[];
  /** Odds ratios with any one batch left out. */
  leaveOneOut: { lowest: number; highest: number } | null;
  bins: readonly ValueBin[];
  /** Numbers: exposed are the batches above it. */
  above: number | null;
}

const DIFFERS_BELOW = 0.1;

/**
 * One cause in detail: the cell as the board has it, and what it rests on.
 *
 * The whole board is asked, so that q and grade are the board's own.
 *
 * @param asked fault, input and level of the cell (null for numbers)
 * @returns null when the board has no such cell
 *
 * Source: as causesBoard; Mantel-Haenszel 1959, Breslow-Day 1980 with Tarone 1985. Cost: the board's, or a few fits when it is given.
 */
export function oneCause(question: BoardQuestion, asked: { fault: string; input: string; level: string | null }, cells: readonly BoardCell[] = causesBoard(question).cells): CauseDetail | null {
  const cell = cells.find((own) => own.fault === asked.fault && own.input === asked.input && own.level === asked.level);
  const fault = question.faults.find((own) => own.slug === asked.fault);
  if (!cell || !fault) return null;
  const bench = layOut(question.rows, question.inputs);
  const column = bench.columns.find((own) => own.term.input === asked.input && own.term.level === asked.level);
  if (cell.grade === 'comes-after' || !column) return { cell, strata: [], mantelHaenszel: null, homogeneityP: null, differs: false, without: [], leaveOneOut: null, bins: [], above: null };
  const own = faultBench(bench, sparseRows(bench.columns, bench.hot), fault);
  const counts = countCell(bench, column, own.outcome);
  const strata = strataOf(bench, counts, column, own.outcome);
  const tables = column.isFlag ? strata.map((stratum) => stratum.table) : [];
  const common = mantelHaenszel(tables);
  const homogeneityP = common.kind === 'answer' ? (breslowDay(tables, common.oddsRatio.estimate)?.p ?? null) : null;
  const adjusters = cell.adjustedFor.map((term) => bench.columns.find((other) => other.term.input === term.input && other.term.level === term.level)!);
  return {
    cell, above: counts.above,
    strata: strata.map(({ method, maker, table }) => {
      const [exposedN, unexposedN] = [table.exposedFound + table.exposedClear, table.unexposedFound + table.unexposedClear];
      return {
        method, maker, exposedN, exposedEvents: table.exposedFound, unexposedN, unexposedEvents: table.unexposedFound,
        exposedRate: wilsonOrNone(table.exposedFound, exposedN), unexposedRate: wilsonOrNone(table.unexposedFound, unexposedN),
      };
    }),
    mantelHaenszel: common.kind === 'answer' ? common.oddsRatio : null,
    homogeneityP, differs: homogeneityP !== null && homogeneityP < DIFFERS_BELOW,
    ...(cell.method === 'none' ? { without: [], leaveOneOut: null } : sensitivity(bench, column, counts, adjusters, designFor(bench, own, column, counts))),
    bins: column.isFlag ? [] : binsOf(column, counts, own.outcome),
  };
}

function sensitivity(bench: Bench, column: Column, counts: CellCounts, adjusters: readonly Column[], make: ReturnType<typeof designFor>): Pick<CauseDetail, 'without' | 'leaveOneOut'> {
  const times = spreadsInRange(column);
  const without = adjusters.flatMap((left) => {
    const fit = fitCell(make, adjusters.filter((other) => other !== left), false, bench.n);
    return fit ? [{ term: left.term, ...asOddsRatio(fit.logOdds, times) }] : [];
  });
  const whole = fitCell(make, adjusters, false, bench.n);
  const range = whole && leaveOneOutRange(whole.design, whole.fit);
  const leaveOneOut = range && { lowest: Math.exp(range.lowest * times), highest: Math.exp(range.highest * times) };
  return { without, leaveOneOut: counts.n > 1 ? leaveOneOut : null };
}

/** At least so many checked batches a bin, at most so many bins. */
const BIN_LEAST = 8;
const MOST_BINS = 8;

function binsOf(column: Column, counts: CellCounts, outcome: Int8Array): ValueBin[] {
  const members = [...counts.members].sort((a, b) => column.values[a]! - column.values[b]! || a - b);
  const bins = Math.min(MOST_BINS, Math.floor(members.length / BIN_LEAST));
  const answer: ValueBin[] = [];
  let start = 0;
  for (let bin = 1; bin <= bins && start < members.length; bin++) {
    let stop = bin === bins ? members.length : Math.max(start + 1, Math.round((bin * members.length) / bins));
    // Batches of one value stay in one bin.
    while (stop < members.length && column.values[members[stop]!] === column.values[members[stop - 1]!]) stop++;
    const own = members.slice(start, stop);
    const events = own.filter((i) => outcome[i]! > 0).length;
    answer.push({ from: column.values[own[0]!]!, to: column.values[own[own.length - 1]!]!, n: own.length, events, ...wilsonInterval(events, own.length) });
    start = stop;
  }
  return answer;
}
