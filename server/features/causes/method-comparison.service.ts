import type { CausesFilter } from '#shared/causes.ts';
import type { MethodComparison } from '#shared/method-comparison.ts';
import type { Work } from '#server/http/api.ts';
import type { AnswerPool } from './answer-pool.ts';
import { withAnswers } from './answers.read.ts';
import { BOARD_FAULTS } from './board-faults.ts';
import { causeCell } from './causes.service.ts';
import { levelLabel } from './level-labels.ts';

/** Hot against cold, every fault side by side, and what was never made in both. */
export async function readMethodComparison(pool: AnswerPool, work: Work, filter: Omit<CausesFilter, 'family'>): Promise<MethodComparison> {
  return withAnswers(pool, work, filter, async (answers) => {
    const { answer: { comparison, onlyIn } } = await answers.ask({ ask: 'methods' });
    const names = new Map(BOARD_FAULTS.map(({ slug, name }) => [slug, name]));
    return {
      generatedFrom: answers.generatedFrom, batches: comparison.batches, by: [...comparison.by],
      faults: comparison.faults.map(({ neverMet, cell, ...one }) => ({
        ...one, name: names.get(one.fault) ?? one.fault, cell: cell && causeCell(cell),
        neverMet: neverMet.map(({ stratum, hotN, coldN }) => ({ makerName: answers.names.members.get(stratum['maker'] ?? '') ?? null, hotN, coldN })),
      })),
      onlyIn: onlyIn.map((one) => ({ ...one, ...levelLabel(answers.names, one.input, one.level) })),
    };
  });
}
