import type { MaterialView } from '#shared/materials.ts';
import type { MaterialKind } from '#shared/words/lot-words.ts';
import { pageFrom, readCursor } from '#server/db/keyset.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { notFound } from '#server/problem.ts';
import { Material } from './material.entity.ts';

export function materialView({ withdrawnAt, createdAt, updatedAt, ...material }: Material): MaterialView {
  return { ...material, createdAt: createdAt.toISOString(), updatedAt: updatedAt.toISOString(), isWithdrawn: withdrawnAt !== null };
}

/** One material. @throws Problem 404 */
export async function readMaterial(tx: WorkshopTransaction, materialId: string): Promise<MaterialView> {
  const material = await tx.manager.findOne(Material, { where: { id: materialId } });
  if (!material) throw notFound('material');
  return materialView(material);
}

/** A page of materials by name, of one kind where asked for. */
export async function listMaterials(tx: WorkshopTransaction, { cursor, limit, kind }: { cursor?: string; limit: number; kind?: MaterialKind }) {
  const query = tx.manager.createQueryBuilder(Material, 'material').where('true').orderBy('material.name').addOrderBy('material.id').limit(limit + 1);
  if (kind) query.andWhere('material.kind = :kind', { kind });
  if (cursor) {
    const [name, lastId] = readCursor(cursor, ['text', 'uuid']);
    query.andWhere('(material.name, material.id) > (:name, :lastId::uuid)', { name, lastId });
  }
  const { items, next } = pageFrom(await query.getMany(), limit, (material) => [material.name, material.id]);
  return { items: items.map(materialView), next };
}
