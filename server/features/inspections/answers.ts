import { v7 as uuidv7 } from 'uuid';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import type { AnswerWish } from './checklist-answers.ts';

/** Writes answers of one look; those already given are replaced, fault by fault. */
export async function storeAnswers(tx: WorkshopTransaction, look: { inspectionId: string; batchId: string }, answers: readonly AnswerWish[]): Promise<void> {
  if (answers.length === 0) return;
  await tx.rows(
    `insert into checklist_answer (workshop_id, id, inspection_id, batch_id, fault, answer)
     select $1, id, $2, $3, fault, answer from jsonb_to_recordset($4::jsonb) as r (id uuid, fault text, answer text)
     on conflict (workshop_id, inspection_id, fault) do update set answer = excluded.answer where checklist_answer.answer <> excluded.answer`,
    [tx.workshopId, look.inspectionId, look.batchId, JSON.stringify(answers.map((answer) => ({ id: uuidv7(), ...answer })))],
  );
}
