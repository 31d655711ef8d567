import type { ChangeMaterial, MaterialView, NewMaterial } from '#shared/materials.ts';
import { insertOnce, lockForChange, saveChange } from '#server/db/records.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { Material } from './material.entity.ts';
import { materialView, readMaterial } from './materials.read.ts';

/** Adds a material; the same request again gives the same one. @throws Problem 409 when the id holds another */
export async function addMaterial(tx: WorkshopTransaction, wish: NewMaterial): Promise<{ view: MaterialView; again: boolean }> {
  const again = await insertOnce(tx, Material, 'material', { ...wish, version: 1, updatedAt: tx.now }, wish);
  return { view: await readMaterial(tx, wish.id), again };
}

/** Changes what is named in `change`; the kind stays, lots and batches rest on it. @throws Problem 404, 412 stale */
export async function changeMaterial(tx: WorkshopTransaction, materialId: string, { isWithdrawn, ...fields }: ChangeMaterial, version: number): Promise<MaterialView> {
  const material = await lockForChange(tx, Material, 'material', materialId, version, materialView);
  Object.assign(material, fields);
  if (isWithdrawn !== undefined) material.withdrawnAt = isWithdrawn ? (material.withdrawnAt ?? tx.now) : null;
  return materialView(await saveChange(tx, Material, material));
}
