import type { SupplierView } from '#shared/suppliers.ts';
import { pageFrom, readCursor } from '#server/db/keyset.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { notFound } from '#server/problem.ts';
import { Supplier } from './supplier.entity.ts';

export function supplierView(supplier: Supplier): SupplierView {
  return {
    id: supplier.id,
    version: supplier.version,
    createdAt: supplier.createdAt.toISOString(),
    updatedAt: supplier.updatedAt.toISOString(),
    name: supplier.name,
    contactName: supplier.contactName,
    email: supplier.email,
    phone: supplier.phone,
    note: supplier.note,
    isWithdrawn: supplier.withdrawnAt !== null,
  };
}

/** One supplier. @throws Problem 404 */
export async function readSupplier(tx: WorkshopTransaction, supplierId: string): Promise<SupplierView> {
  const supplier = await tx.manager.findOne(Supplier, { where: { id: supplierId } });
  if (!supplier) throw notFound('supplier');
  return supplierView(supplier);
}

/** A page of suppliers, by name. */
export async function listSuppliers(tx: WorkshopTransaction, { cursor, limit }: { cursor?: string; limit: number }) {
  const query = tx.manager.createQueryBuilder(Supplier, 'supplier').orderBy('supplier.name').addOrderBy('supplier.id').limit(limit + 1);
  if (cursor) {
    const [name, lastId] = readCursor(cursor, ['text', 'uuid']);
    query.where('(supplier.name, supplier.id) > (:name, :lastId::uuid)', { name, lastId });
  }
  const { items, next } = pageFrom(await query.getMany(), limit, (supplier) => [supplier.name, supplier.id]);
  return { items: items.map(supplierView), next };
}
