import { v7 as uuidv7 } from 'uuid';
import type { CookStageWish, IngredientWish } from '#shared/batch-fields.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { BatchIngredient, CookStageRow } from './ingredient.entity.ts';

/** Puts these lines in the place of those that were there; the trail keeps both. */
export async function replaceIngredients(tx: WorkshopTransaction, batchId: string, lines: readonly IngredientWish[]): Promise<void> {
  await tx.manager.delete(BatchIngredient, { batchId });
  if (lines.length === 0) return;
  await tx.manager.insert(BatchIngredient, lines.map((line, position) => ({ ...line, workshopId: tx.workshopId, batchId, position })));
}

export async function replaceCookStages(tx: WorkshopTransaction, batchId: string, stages: readonly CookStageWish[]): Promise<void> {
  await tx.manager.delete(CookStageRow, { batchId });
  if (stages.length === 0) return;
  await tx.manager.insert(CookStageRow, stages.map((stage) => ({ ...stage, id: uuidv7(), workshopId: tx.workshopId, batchId })));
}

export function storedIngredients(tx: WorkshopTransaction, batchId: string): Promise<BatchIngredient[]> {
  return tx.manager.find(BatchIngredient, { where: { batchId }, order: { position: 'ASC' } });
}
