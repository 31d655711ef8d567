import type { BoardCell } from '#analysis/causes/board-rows.ts';
import type { BatchBehind, BoardFault, BoardInput, CauseCell, CauseDetail, CausesBoard, CausesFilter } from '#shared/causes.ts';
import type { Method } from '#shared/words/methods.ts';
import type { Stage } from '#shared/words/stages.ts';
import type { Work } from '#server/http/api.ts';
import { notFound } from '#server/problem.ts';
import type { AnswerPool } from './answer-pool.ts';
import { withAnswers, type Answers } from './answers.read.ts';
import { BOARD_FAULTS } from './board-faults.ts';
import { BOARD_INPUTS, inputOf } from './board-inputs.ts';
import { firmestFirst } from './grade-order.ts';
import { levelLabel, termLabel } from './level-labels.ts';

/** The whole board: faults against inputs under a filter. */
export async function readBoard(pool: AnswerPool, work: Work, filter: CausesFilter): Promise<CausesBoard> {
  return withAnswers(pool, work, filter, (answers) => ({
    generatedFrom: answers.generatedFrom,
    faults: BOARD_FAULTS.map((fault) => boardFault(answers, fault.slug)),
    inputs: BOARD_INPUTS.map((input) => boardInput(answers, input.slug)),
    cells: answers.board.board.cells.map(causeCell),
  }));
}

export interface AskedCause { fault: string; input: string; level?: string | undefined }

/** One cause with what it rests on; without a level the firmest of the input. @throws Problem 404 */
export async function readCause(pool: AnswerPool, work: Work, { fault, input, level, ...filter }: AskedCause & CausesFilter): Promise<CauseDetail> {
  knownOrNotFound(fault, input);
  return withAnswers(pool, work, filter, async (answers) => {
    const cell = cellAsked(answers, { fault, input, level });
    const { answer } = await answers.ask({ ask: 'cause', fault, input, level: cell.level });
    if (!answer) throw notFound('cause');
    const { names } = answers;
    const term = (one: { input: string; level: string | null }) => ({ input: one.input, level: one.level, label: termLabel(names, one) });
    return {
      generatedFrom: answers.generatedFrom,
      fault: boardFault(answers, fault), input: boardInput(answers, input),
      levelLabel: cell.level === null ? null : termLabel(names, cell),
      cell: causeCell(cell), raw: cell.raw, p: cell.p,
      leftOut: cell.leftOut.map(({ reason, count }) => ({ reason, count })),
      adjustedFor: cell.adjustedFor.map(term),
      onThePath: cell.onThePath.map((slug) => ({ input: slug, name: inputOf(slug)?.name ?? slug })),
      tiedWith: cell.tiedWith.map(term),
      perSpread: cell.perSpread,
      strata: answer.strata.map((stratum) => ({ ...stratum, method: stratum.method as Method, makerName: stratum.maker === null ? null : (names.members.get(stratum.maker) ?? null) })),
      mantelHaenszel: answer.mantelHaenszel, homogeneityP: answer.homogeneityP, differs: answer.differs,
      without: answer.without.map(({ term: left, ...odds }) => ({ ...odds, term: term(left) })),
      leaveOneOut: answer.leaveOneOut, bins: [...answer.bins], above: answer.above,
      meltedAway: answers.board.board.cells.filter((one) => one.fault === fault && one.meltsAway && one !== cell)
        .map(({ exposedN, exposedEvents, unexposedN, unexposedEvents, ...one }) => ({ ...term(one), exposedN, exposedEvents, unexposedN, unexposedEvents })),
    };
  });
}

/** The batches behind a figure, newest first. @throws Problem 404 */
export async function readBatchesBehind(
  pool: AnswerPool, work: Work,
  { fault, input, level, group, outcome, ...filter }: AskedCause & CausesFilter & { group?: 'exposed' | 'unexposed' | undefined; outcome?: BatchBehind['outcome'] | undefined },
): Promise<{ items: BatchBehind[]; total: number }> {
  knownOrNotFound(fault, input);
  return withAnswers(pool, work, filter, async (answers) => {
    const cell = cellAsked(answers, { fault, input, level });
    const { answer } = await answers.ask({ ask: 'behind', fault, input, level: cell.level, ...(group ? { group } : {}), ...(outcome ? { outcome } : {}) });
    return answer;
  });
}

function knownOrNotFound(fault: string, input: string): void {
  if (!BOARD_FAULTS.some((one) => one.slug === fault)) throw notFound('fault');
  if (!inputOf(input)) throw notFound('input');
}

function cellAsked(answers: Answers, { fault, input, level }: AskedCause): BoardCell {
  const own = answers.board.board.cells.filter((cell) => cell.fault === fault && cell.input === input && (level === undefined || cell.level === level));
  const cell = own.sort(firmestFirst)[0];
  if (!cell) throw notFound(level === undefined ? 'cause' : 'level');
  return cell;
}

export function boardFault({ board }: Answers, slug: string): BoardFault {
  const spec = BOARD_FAULTS.find((one) => one.slug === slug);
  const count = board.faults.find((one) => one.fault === slug);
  if (!spec || !count) throw notFound('fault');
  return { ...count, name: spec.name, firstSeen: spec.firstSeen as Stage };
}

function boardInput({ board, names }: Answers, slug: string): BoardInput {
  const spec = inputOf(slug);
  if (!spec) throw notFound('input');
  const levels = (board.levels[slug] ?? []).map((level) => ({ level, ...levelLabel(names, slug, level) }));
  return { input: spec.slug, name: spec.name, group: spec.group, kind: spec.kind, unit: spec.unit, levels };
}

/** Four figures are more than any count of batches can tell apart. */
const short = (value: number | null) => (value === null ? null : Number(value.toPrecision(4)));

export function causeCell({ raw, q, estimate, lower, upper, tiedWith, ...cell }: BoardCell): CauseCell {
  return {
    ...cell, tiedWith: [...tiedWith], onThePath: [...cell.onThePath],
    estimate: short(estimate), lower: short(lower), upper: short(upper), rawEstimate: short(raw.estimate), q: short(q),
  };
}
