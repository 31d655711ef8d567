import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';

/** Digits of a batch number; longer ones are written out. */
const DIGITS = 4;

/**
 * The workshop's next batch code, e.g. `QL-0142`. The workshop's row stays locked until the commit, so two
 * makers never get the same number; a batch that is already there keeps its own and takes none.
 */
export async function nextBatchCode(tx: WorkshopTransaction, batchId: string): Promise<string> {
  const workshop = await tx.row<{ prefix: string; next: number }>(
    'select batch_prefix prefix, next_batch_number next from workshop where id = $1 for update', [tx.workshopId],
  );
  if (!workshop) throw new Error('the workshop of the transaction is not there');
  const already = await tx.row<{ code: string }>('select code from batch where id = $1', [batchId]);
  if (already) return already.code;
  let number = workshop.next;
  // Codes can also be typed in, so a number may be taken already.
  while (await tx.row('select 1 from batch where code = $1', [codeOf(workshop.prefix, number)])) number += 1;
  await tx.rows('update workshop set next_batch_number = $2 where id = $1', [tx.workshopId, number + 1]);
  return codeOf(workshop.prefix, number);
}

function codeOf(prefix: string, number: number): string {
  return `${prefix}-${String(number).padStart(DIGITS, '0')}`;
}
