import { smallestReachableP, oddsRatio } from '#analysis/tables/fisher.ts';
import type { BoardCell, Estimate, LeftOut, Term } from './board-rows.ts';
import { candidatesFor, chooseAdjusters } from './adjust.ts';
import { MOST_INFLATION, confinedTo, movesWith, neverMeets, varianceInflation } from './cannot-tell-apart.ts';
import { cellDesign } from './cell-design.ts';
import type { Bench, Column } from './columns.ts';
import { countCell } from './counts.ts';
import type { CellCounts } from './counts.ts';
import { byText } from './exposure.ts';
import type { FaultBench } from './fault-bench.ts';
import { asOddsRatio, fitAlone, fitCell } from './fit-cell.ts';
import type { CellFit } from './fit-cell.ts';
import { moreNeeded } from './grade.ts';
import { isSameQuantity } from './what-comes-first.ts';

/** A cell enters only if it could be decided at all (our rule). */
const REACHABLE_P = 0.01;
const LEAST = 3;
/** From so many exposed batches on, all in one family by one maker, the record cannot say more about that than "not told apart". */
const CONFINED_FROM = 5;

export interface AskedCell {
  cell: BoardCell;
  column: Column;
  counts: CellCounts;
  /** Present when the cell entered its family of questions. */
  fit: CellFit | null;
  /** What to name if it turns out to be too little: all exposed share method family and maker. */
  confined: readonly Term[];
}

/** The cell before anything is fitted: counts, raw odds ratio, and the grade that follows from counts alone. */
function emptyCell(bench: Bench, faultBench: FaultBench, column: Column, counts: CellCounts): BoardCell {
  const { table } = counts;
  const noValue: LeftOut[] = counts.noValue > 0 ? [{ reason: 'no-value', count: counts.noValue }] : [];
  const exposedN = table.exposedFound + table.exposedClear;
  const unexposedN = table.unexposedFound + table.unexposedClear;
  const nothingVaries = counts.events === 0 || counts.events === counts.n || exposedN === 0 || unexposedN === 0;
  return {
    fault: faultBench.fault.slug, input: column.term.input, level: column.term.level,
    grade: nothingVaries ? 'no-variation' : 'too-few', direction: 'none',
    n: counts.n, events: counts.events, notChecked: counts.notChecked,
    leftOut: [...bench.leftOut, ...noValue].sort((a, b) => byText(a.reason, b.reason)),
    exposedN, exposedEvents: table.exposedFound, unexposedN, unexposedEvents: table.unexposedFound,
    raw: column.isFlag && !nothingVaries ? rawOf(oddsRatio(table)) : NOTHING,
    estimate: null, lower: null, upper: null, p: null, q: null, method: 'none',
    range: column.range, perSpread: null, adjustedFor: [], onThePath: [], tiedWith: [],
    moreNeeded: moreNeeded(exposedN, unexposedN, table.unexposedFound, counts.events), meltsAway: false,
  };
}

const NOTHING: Estimate = { estimate: null, lower: null, upper: null };

function rawOf({ estimate, lower, upper }: Estimate): Estimate {
  return { estimate, lower, upper };
}

/** A cell that comes after its fault, or an input without any value: one for the whole input. */
export function cellComesAfter(bench: Bench, faultBench: FaultBench, input: string): BoardCell {
  return {
    fault: faultBench.fault.slug, input, level: null, grade: 'comes-after', direction: 'none',
    n: faultBench.checked, events: faultBench.events, notChecked: bench.n - faultBench.checked, leftOut: bench.leftOut,
    exposedN: 0, exposedEvents: 0, unexposedN: 0, unexposedEvents: 0, raw: NOTHING, ...NOTHING,
    p: null, q: null, method: 'none', range: null, perSpread: null, adjustedFor: [], onThePath: [], tiedWith: [], moreNeeded: null, meltsAway: false,
  };
}

/** Whether the margins could ever give a small enough p, and each side has at least three. */
function canBeDecided(column: Column, counts: CellCounts, cell: BoardCell): boolean {
  if (cell.grade === 'no-variation') return false;
  const smallest = Math.min(cell.exposedN, cell.unexposedN, counts.events, counts.n - counts.events);
  if (smallest < LEAST) return false;
  if (!column.isFlag) return column.spread > 0 && column.range !== null && column.range.high > column.range.low;
  return smallestReachableP(counts.table, column.spec.class === 'lot') <= REACHABLE_P;
}

/** Offsets without the asked lot's own and without lots the asked input is a property of. */
function offsetFor(bench: Bench, faultBench: FaultBench, column: Column): Float64Array {
  const drop = [...faultBench.effects].filter(([lot]) => lot === column || (column.spec.class !== 'lot' && isSameQuantity(column.term.input, lot.term.input)));
  if (drop.length === 0) return faultBench.offset;
  const offset = Float64Array.from(faultBench.offset);
  for (const [lot, effect] of drop) for (let i = 0; i < bench.n; i++) if (lot.values[i] === 1) offset[i]! -= effect;
  return offset;
}

/** The design of a cell for any set of adjusters, the weaker ones last. */
export function designFor(bench: Bench, faultBench: FaultBench, column: Column, counts: CellCounts): (adjusters: readonly Column[]) => ReturnType<typeof cellDesign> {
  const offset = offsetFor(bench, faultBench, column);
  const hot = counts.members.reduce((sum, i) => sum + bench.hot[i]!, 0);
  const withFamily = column.term.input !== 'methodFamily' && hot > 0 && hot < counts.n;
  return (adjusters) => cellDesign(bench, counts.members, faultBench.outcome, { asked: column, withFamily, adjusters, offset });
}

/** Counts, screens and fits one cell; grade and q come once all cells are known. */
export function askCell(bench: Bench, faultBench: FaultBench, column: Column): AskedCell {
  const counts = countCell(bench, column, faultBench.outcome);
  const cell = emptyCell(bench, faultBench, column, counts);
  const asked: AskedCell = { cell, column, counts, fit: null, confined: [] };
  if (!canBeDecided(column, counts, cell)) return asked;
  const { eligible, onThePath } = candidatesFor(column, bench.columns, faultBench.fault);
  cell.onThePath = onThePath;
  const tied = [...neverMeets(bench, counts, column), ...movesWith(bench, column, eligible)];
  // Three or four batches that share nothing with the others are above all few.
  if (tied.length > 0) return Math.min(cell.exposedN, cell.unexposedN) < CONFINED_FROM ? asked : cannotBeTold(asked, tied);

  const given = column.term.input === 'methodFamily' ? 'plain' : 'within';
  const chosen = chooseAdjusters(bench, column, eligible, (other) => faultBench.withFault(other, given), Math.min(counts.events, counts.n - counts.events));
  const make = designFor(bench, faultBench, column, counts);
  const inflation = chosen.length > 0 ? varianceInflation(make(chosen)) : 1;
  if (inflation === null || inflation > MOST_INFLATION) return cannotBeTold(asked, chosen.map((other) => other.term));
  asked.fit = fitCell(make, chosen, column.spec.class === 'lot', bench.n);
  if (asked.fit) writeFit(bench, faultBench, asked, asked.fit);
  if (cell.exposedN >= CONFINED_FROM) asked.confined = confinedTo(bench, counts, column);
  return asked;
}

function cannotBeTold(asked: AskedCell, partners: readonly Term[]): AskedCell {
  const named = new Map(partners.map((term) => [`${term.input}\n${term.level ?? ''}`, term]));
  asked.cell.grade = 'not-told-apart';
  asked.cell.moreNeeded = null;
  asked.cell.tiedWith = [...named].sort(([a], [b]) => byText(a, b)).map(([, term]) => term);
  return asked;
}

/** How many reference spreads the quoted range is; 1 for levels. */
export function spreadsInRange(column: Column): number {
  return column.range === null ? 1 : (column.range.high - column.range.low) / column.spread;
}

function writeFit(bench: Bench, faultBench: FaultBench, { cell, column, counts }: AskedCell, fit: CellFit): void {
  Object.assign(cell, asOddsRatio(fit.logOdds, spreadsInRange(column)));
  cell.p = fit.p;
  cell.method = fit.method;
  cell.adjustedFor = fit.adjusters.map((adjuster) => adjuster.term);
  if (!column.isFlag) {
    cell.perSpread = { ...asOddsRatio(fit.logOdds), spread: column.spread };
    const alone = fitAlone(cellDesign(bench, counts.members, faultBench.outcome, { asked: column, withFamily: false, adjusters: [], offset: null }));
    if (alone) cell.raw = asOddsRatio(alone, spreadsInRange(column));
  }
  cell.meltsAway = excludesOne(cell.raw) && !excludesOne(cell);
}

function excludesOne({ lower, upper }: Estimate): boolean {
  return (lower !== null && lower > 1) || (upper !== null && upper < 1);
}
