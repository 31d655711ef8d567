import type { CausesFilter, GeneratedFrom } from '#shared/causes.ts';
import { dayIn } from '#shared/units/zones.ts';
import type { Work } from '#server/http/api.ts';
import { invalidField } from '#server/problem.ts';
import type { BoardAnswer, Question } from './answer-bench.ts';
import type { Answered, AnswerPool } from './answer-pool.ts';
import { batchFacts, dataRevision } from './causes.read.ts';
import { readNames, type Names } from './names.read.ts';

export interface Answers {
  names: Names;
  board: BoardAnswer;
  generatedFrom: GeneratedFrom;
  ask<Q extends Question>(question: Q): Promise<Answered<Q['ask']>>;
}

/**
 * The answers about the batches of a filter. Rows are read in one transaction, which ends before anything
 * is worked out; `use` may ask as often as it needs.
 */
export async function withAnswers<T>(pool: AnswerPool, work: Work, filter: CausesFilter, use: (answers: Answers) => Promise<T> | T): Promise<T> {
  if (filter.from && filter.to && filter.from > filter.to) throw invalidField('#/from', 'From must not lie after To');
  const { bench, names, revision } = await work(async (tx) => {
    const [revision, names] = [await dataRevision(tx), await readNames(tx)];
    if (filter.formula && !names.formulas.has(filter.formula)) throw invalidField('#/formula', 'There is no such formula in this workshop');
    const today = dayIn(names.timeZone, tx.now);
    const key = JSON.stringify([tx.workshopId, revision, today, filter.from, filter.to, filter.family, filter.formula]);
    const { bench, loading } = pool.open(key, today, () => batchFacts(tx, filter));
    try {
      await loading;
    } catch (error) {
      pool.release(bench);
      throw error;
    }
    return { bench, names, revision };
  });
  try {
    await bench.filled;
    const { answer, computedAt, ms } = await pool.ask(bench, { ask: 'board' });
    return await use({
      names, board: answer, ask: (question) => pool.ask(bench, question),
      generatedFrom: {
        batches: answer.board.generatedFrom.batches,
        leftOut: answer.board.generatedFrom.leftOut.map(({ reason, count }) => ({ reason, count })),
        filter: {
          from: filter.from ?? null, to: filter.to ?? null, family: filter.family ?? null,
          formula: filter.formula ? { id: filter.formula, name: names.formulas.get(filter.formula) ?? '' } : null,
        },
        firstMadeOn: answer.firstMadeOn, lastMadeOn: answer.lastMadeOn,
        dataRevision: revision, computedAt: computedAt.toISOString(), computedMs: ms, questions: answer.board.questions,
      },
    });
  } finally {
    pool.release(bench);
  }
}
