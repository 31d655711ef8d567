import { askCell, cellComesAfter, spreadsInRange } from './ask-cell.ts';
import type { AskedCell } from './ask-cell.ts';
import type { BatchRow, Board, BoardCell, FaultSpec, InputSpec } from './board-rows.ts';
import { layOut } from './columns.ts';
import type { Bench } from './columns.ts';
import { falseDiscoveryRates } from './false-discovery.ts';
import { faultBench } from './fault-bench.ts';
import type { FaultBench } from './fault-bench.ts';
import { gradeOf } from './grade.ts';
import { survivesAnyBatch } from './leave-one-out.ts';
import { sparseRows } from './lot-offsets.ts';
import { somePointBack } from './strata.ts';
import { comesAfter } from './what-comes-first.ts';

export interface BoardQuestion {
  rows: readonly BatchRow[];
  inputs: readonly InputSpec[];
  faults: readonly FaultSpec[];
}

/** What the trade names as a usual suspect of a fault weighs so much against 1 (our rule, fixed beforehand). */
const SUSPECT_WEIGHT = 4;

/** So many of the most weakening batches are refitted when one is left out; large workshops need fewer. */
const OMITTED = 8;
const OMITTED_WHEN_LARGE = 2;
const LARGE = 5000;

/**
 * The causes board: every fault against every input, each cell with an evidence grade.
 *
 * Each input is asked about with the method family held still, with the lots a
 * batch holds taken as known, and with what else moved with it adjusted for.
 * False discoveries are held down over the whole board, lots apart from the rest.
 *
 * @param question rows in any order (their ids must differ); inputs and faults in any order
 * @returns cells in the order of the given faults, inside them of the given inputs, inside them by level
 * @throws RangeError when two rows have one id, or a stage is unknown
 *
 * Source: penalised logistic fits (Firth 1993; Heinze & Schemper 2002), weighted Benjamini-Hochberg (1995; Genovese et al. 2006)
 * with Tarone's screen (1990); grades and the choice of adjusters are our rule. Cost: about faults · inputs fits.
 */
export function causesBoard({ rows, inputs, faults }: BoardQuestion): Board {
  if (new Set(rows.map((row) => row.id)).size !== rows.length) throw new RangeError('causesBoard: every row needs an id of its own');
  const bench = layOut(rows, inputs);
  const sparse = sparseRows(bench.columns, bench.hot);
  const asked: { faultBench: FaultBench; cells: (AskedCell | BoardCell)[] }[] = faults.map((fault) => {
    const own = faultBench(bench, sparse, fault);
    return { faultBench: own, cells: inputs.flatMap((input) => askInput(bench, own, input)) };
  });
  const entered = asked.flatMap(({ faultBench: own, cells }) => cells.flatMap((cell) => (isAsked(cell) && cell.fit ? [{ own, cell }] : [])));
  const lots = entered.filter(({ cell }) => cell.column.spec.class === 'lot');
  const others = entered.filter(({ cell }) => cell.column.spec.class !== 'lot');
  for (const family of [lots, others]) giveRates(family);
  for (const { own, cell } of entered) giveGrade(bench, own, cell);
  return {
    generatedFrom: { batches: bench.n, leftOut: bench.leftOut },
    faults: faults.map((fault) => fault.slug),
    inputs: inputs.map((input) => input.slug),
    cells: asked.flatMap(({ cells }) => cells.map((cell) => (isAsked(cell) ? cell.cell : cell))),
    questions: { lots: lots.length, others: others.length },
  };
}

function isAsked(cell: AskedCell | BoardCell): cell is AskedCell {
  return 'column' in cell;
}

function askInput(bench: Bench, own: FaultBench, input: InputSpec): (AskedCell | BoardCell)[] {
  if (comesAfter(input.knownAt, own.fault.slug, own.fault.firstSeen)) return [cellComesAfter(bench, own, input.slug)];
  return bench.columns.filter((column) => column.asked && column.term.input === input.slug).map((column) => askCell(bench, own, column));
}

/** Method family is what the catalogue's suspect `method` means as much as the method itself. */
function isSuspected(fault: FaultSpec, input: string): boolean {
  return fault.suspects.some((suspect) => suspect.input === input || (suspect.input === 'method' && input === 'methodFamily'));
}

function giveRates(family: readonly { own: FaultBench; cell: AskedCell }[]): void {
  const weights = family.map(({ own, cell }) => (isSuspected(own.fault, cell.column.term.input) ? SUSPECT_WEIGHT : 1));
  const rates = falseDiscoveryRates(family.map(({ cell }) => cell.fit!.p), weights);
  for (const [i, { cell }] of family.entries()) cell.cell.q = rates[i]!;
}

function giveGrade(bench: Bench, own: FaultBench, { cell, column, counts, fit, confined }: AskedCell): void {
  const { design, fit: firth, logOdds, p } = fit!;
  const times = spreadsInRange(column);
  const scaled = (value: number | null) => (value === null ? null : value * times);
  cell.grade = gradeOf({
    q: cell.q!, p, isNumber: !column.isFlag, harmOnly: column.spec.class === 'lot',
    overRange: { estimate: logOdds.estimate * times, lower: scaled(logOdds.lower), upper: scaled(logOdds.upper) },
    perSpread: logOdds,
    exposedN: cell.exposedN, exposedEvents: cell.exposedEvents, events: cell.events,
    survivesAnyBatch: () => survivesAnyBatch(design, firth, bench.n > LARGE ? OMITTED_WHEN_LARGE : OMITTED),
    noStratumPointsBack: () => !somePointBack(bench, counts, column, own.outcome, logOdds.estimate),
  });
  if (cell.grade === 'too-few' && confined.length > 0) {
    cell.grade = 'not-told-apart';
    cell.tiedWith = confined;
  }
  if (cell.grade !== 'too-few') cell.moreNeeded = null;
  if (['settled', 'likely', 'hint', 'too-few'].includes(cell.grade)) cell.direction = logOdds.estimate > 0 ? 'more' : 'less';
}
