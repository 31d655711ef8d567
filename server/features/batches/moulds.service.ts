import type { Mould, NewMould } from '#shared/batches.ts';
import { insertOnce } from '#server/db/records.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { notFound } from '#server/problem.ts';
import { MouldRecord } from './mould.entity.ts';

/** Adds a mould; the same request again gives the same mould. @throws Problem 409 for a name or id in use */
export async function addMould(tx: WorkshopTransaction, wish: NewMould): Promise<{ view: Mould; again: boolean }> {
  const again = await insertOnce(tx, MouldRecord, 'mould', { ...wish, version: 1, updatedAt: tx.now }, wish);
  const mould = await tx.manager.findOne(MouldRecord, { where: { id: wish.id } });
  if (!mould) throw notFound('mould');
  const { id, version, name, oilMassG, bars, createdAt, updatedAt } = mould;
  return { view: { id, version, name, oilMassG, bars, createdAt: createdAt.toISOString(), updatedAt: updatedAt.toISOString() }, again };
}
