import type { ChangeSupplier, NewSupplier, SupplierView } from '#shared/suppliers.ts';
import { insertOnce, lockForChange, saveChange } from '#server/db/records.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { Supplier } from './supplier.entity.ts';
import { readSupplier, supplierView } from './suppliers.read.ts';

/** Adds a supplier; the same request again gives the same supplier. @throws Problem 409 when the id holds another */
export async function addSupplier(tx: WorkshopTransaction, wish: NewSupplier): Promise<{ view: SupplierView; again: boolean }> {
  const again = await insertOnce(tx, Supplier, 'supplier', { ...wish, version: 1, updatedAt: tx.now }, wish);
  return { view: await readSupplier(tx, wish.id), again };
}

/** Changes what is named in `change`. @throws Problem 404, 412 stale */
export async function changeSupplier(tx: WorkshopTransaction, supplierId: string, { isWithdrawn, ...fields }: ChangeSupplier, version: number): Promise<SupplierView> {
  const supplier = await lockForChange(tx, Supplier, 'supplier', supplierId, version, supplierView);
  Object.assign(supplier, fields);
  if (isWithdrawn !== undefined) supplier.withdrawnAt = isWithdrawn ? (supplier.withdrawnAt ?? tx.now) : null;
  return supplierView(await saveChange(tx, Supplier, supplier));
}
