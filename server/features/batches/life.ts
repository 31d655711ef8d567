import { BATCH_LIFE, mayPass } from '#shared/words/batch-life.ts';
import type { BatchState } from '#shared/words/batch-words.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { faultCatalogue } from '#server/features/faults/catalogue.ts';
import { conflict } from '#server/problem.ts';

const SAFETY_FAULTS = faultCatalogue.filter((fault) => fault.kind === 'safety').map((fault) => fault.slug);

/**
 * Refuses a step that the life of a batch does not have, and closing over an open safety finding.
 *
 * @throws Problem 409 for a wrong step, 403 where only an owner may close
 */
export async function passTo(tx: WorkshopTransaction, batch: { id: string; state: BatchState }, to: BatchState): Promise<void> {
  if (!mayPass(batch.state, to)) {
    throw conflict(`A batch that is ${batch.state} cannot become ${to}; it goes ${BATCH_LIFE.join(', ')}, or is abandoned before it is closed`);
  }
  if (to === 'closed' && batch.state !== 'closed' && (await hasOpenSafetyFinding(tx, batch.id))) tx.require('batch.close-unsafe');
}

/** A safety fault is open while the last look that answered it found it. */
async function hasOpenSafetyFinding(tx: WorkshopTransaction, batchId: string): Promise<boolean> {
  const row = await tx.row<{ open: boolean }>(
    `select coalesce(bool_or(last.answer = 'found'), false) open from (
       select distinct on (a.fault) a.answer
       from checklist_answer a join inspection i on i.workshop_id = a.workshop_id and i.id = a.inspection_id
       where a.batch_id = $1 and a.fault = any($2::text[]) and a.answer <> 'not-checked'
       order by a.fault, i.inspected_at desc, i.id desc) last`,
    [batchId, SAFETY_FAULTS],
  );
  return row?.open ?? false;
}
