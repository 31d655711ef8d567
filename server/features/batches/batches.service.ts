import type { AnyBatchView, ChangeBatch, NewBatch } from '#shared/batches.ts';
import { insertOnce, lockForChange, saveChange } from '#server/db/records.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { Batch } from './batch.entity.ts';
import { readWholeBatch } from './batches.read.ts';
import { nextBatchCode } from './batch-code.ts';
import { fragranceFractionOf } from './fragrance-load.ts';
import { passTo } from './life.ts';
import { freezeFormulaVersion, refuseUnknownReferences, refuseWrongOrder } from './references.ts';
import { replaceCookStages, replaceIngredients, storedIngredients } from './what-went-in.ts';

type Whole = AnyBatchView & { seesQuantities: true };

/**
 * Logs a batch; the same request again gives the same batch and takes no second number.
 *
 * @throws Problem 409 when id or code hold another batch, 422 for something that is not in this workshop
 */
export async function logBatch(tx: WorkshopTransaction, wish: NewBatch): Promise<{ view: Whole; again: boolean }> {
  await refuseUnknownReferences(tx, wish);
  refuseWrongOrder(wish);
  const fragranceFraction = await fragranceFractionOf(tx, wish.oilMassG, wish.ingredients);
  const { ingredients, cookStages, pouredAt, ...fields } = wish;
  const code = wish.code ?? (await nextBatchCode(tx, wish.id));
  const again = await insertOnce(
    tx, Batch, 'batch', { ...fields, code, pouredAt: pouredAt ? new Date(pouredAt) : null, fragranceFraction, version: 1, updatedAt: tx.now }, wish,
  );
  if (!again) {
    await replaceIngredients(tx, wish.id, ingredients);
    await replaceCookStages(tx, wish.id, cookStages);
    await freezeFormulaVersion(tx, wish.formulaVersionId);
  }
  return { view: await readWholeBatch(tx, wish.id), again };
}

/**
 * Changes what is named; ingredients and cook stages are replaced whole when they are.
 *
 * @param version version the caller last saw
 * @throws Problem 404, 412 stale, 409 for a step its life does not have, 403 to close over a safety finding, 422
 */
export async function changeBatch(tx: WorkshopTransaction, batchId: string, change: ChangeBatch, version: number): Promise<Whole> {
  const batch = await lockForChange(tx, Batch, 'batch', batchId, version, () => readWholeBatch(tx, batchId));
  const { ingredients, cookStages, pouredAt, state, ...fields } = change;
  const formulaBefore = batch.formulaId;
  if (state !== undefined) await passTo(tx, batch, state);
  Object.assign(batch, fields, state === undefined ? {} : { state }, pouredAt === undefined ? {} : { pouredAt: pouredAt === null ? null : new Date(pouredAt) });
  // Another formula without a word on its version: which one was used is not known.
  if (fields.formulaId !== undefined && fields.formulaVersionId === undefined && fields.formulaId !== formulaBefore) batch.formulaVersionId = null;
  await refuseUnknownReferences(tx, { ...change, formulaId: batch.formulaId, formulaVersionId: batch.formulaVersionId });
  refuseWrongOrder(batch);
  if (ingredients !== undefined || fields.oilMassG !== undefined) {
    batch.fragranceFraction = await fragranceFractionOf(tx, batch.oilMassG, ingredients ?? (await storedIngredients(tx, batchId)));
  }
  if (ingredients) await replaceIngredients(tx, batchId, ingredients);
  if (cookStages) await replaceCookStages(tx, batchId, cookStages);
  await freezeFormulaVersion(tx, change.formulaVersionId);
  await saveChange(tx, Batch, batch);
  return readWholeBatch(tx, batchId);
}
