import type { z } from 'zod';
import type { LotsFilter, LotStandingChange, LotView } from '#shared/lots.ts';
import { pageFrom, readCursor } from '#server/db/keyset.ts';
import { escapeLike } from '#server/db/like.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { notFound } from '#server/problem.ts';

const LOT_SQL = `
  select l.id, l.version, l.created_at "createdAt", l.updated_at "updatedAt", l.material_id "materialId", m.name "materialName", m.kind "materialKind",
    l.supplier_id "supplierId", s.name "supplierName", l.code, l.supplier_product_name "supplierProductName", l.supplier_product_number "supplierProductNumber",
    l.ordered_on::text "orderedOn", l.received_on::text "receivedOn", l.opened_on::text "openedOn", l.finished_on::text "finishedOn", l.best_before_on::text "bestBeforeOn",
    l.quantity_g "quantityG", l.quantity_left_g "quantityLeftG", l.price_minor_per_kg "priceMinorPerKg", l.purity_fraction "purityFraction",
    l.certificate_max_fraction "certificateMaxFraction", l.certificate_edition "certificateEdition", l.certificate_on::text "certificateOn",
    l.flash_point_c "flashPointC", l.vanillin_fraction "vanillinFraction", l.intended_use_note "intendedUseNote", l.storage, l.note, l.standing,
    (select count(distinct i.batch_id)::int from batch_ingredient i where i.workshop_id = l.workshop_id and i.lot_id = l.id) batches
  from lot l
  join material m on m.workshop_id = l.workshop_id and m.id = l.material_id
  left join supplier s on s.workshop_id = l.workshop_id and s.id = l.supplier_id`;

type LotRow = Omit<LotView, 'createdAt' | 'updatedAt'> & { createdAt: Date; updatedAt: Date };

function lotView(row: LotRow): LotView {
  return { ...row, createdAt: row.createdAt.toISOString(), updatedAt: row.updatedAt.toISOString() };
}

/** One lot with the names around it. @throws Problem 404 */
export async function readLot(tx: WorkshopTransaction, lotId: string): Promise<LotView> {
  const statement = `${LOT_SQL} where l.id = $1`;
  const row = await tx.row<LotRow>(statement, [lotId]);
  if (!row) throw notFound('lot');
  return lotView(row);
}

/** A page of lots: those in stock first received last; `find` looks in codes and materials' names. */
export async function listLots(tx: WorkshopTransaction, filter: z.output<typeof LotsFilter>) {
  const [cursorDay, cursorId] = filter.cursor ? readCursor(filter.cursor, ['day', 'uuid']) : [null, null];
  const statement = `${LOT_SQL}
    where ($1::text is null or m.kind = $1) and ($2::text is null or l.standing = $2) and ($3::uuid is null or l.supplier_id = $3)
      and ($4::uuid is null or l.material_id = $4)
      and ($5::text is null or l.code ilike '%' || $5 || '%' or m.name ilike '%' || $5 || '%')
      and ($6::text is null or (coalesce(l.received_on, '1990-01-01')::text, l.id) < ($6, $7::uuid))
    order by coalesce(l.received_on, '1990-01-01')::text desc, l.id desc limit $8`;
  const rows = await tx.rows<LotRow>(statement, [
    filter.kind ?? null, filter.standing ?? null, filter.supplierId ?? null, filter.materialId ?? null,
    filter.find ? escapeLike(filter.find) : null, cursorDay, cursorId, filter.limit + 1,
  ]);
  const { items, next } = pageFrom(rows, filter.limit, (row) => [row.receivedOn ?? '1990-01-01', row.id]);
  return { items: items.map(lotView), next };
}

/** Who changed a lot's standing, when and why, newest first. @throws Problem 404 */
export async function listStandingChanges(tx: WorkshopTransaction, lotId: string): Promise<{ items: LotStandingChange[] }> {
  if (!(await tx.row('select 1 from lot where id = $1', [lotId]))) throw notFound('lot');
  const rows = await tx.rows<Omit<LotStandingChange, 'changedAt'> & { changedAt: Date }>(
    `select c.id, c.before, c.after, c.reason, m.name "memberName", c.changed_at "changedAt"
     from lot_standing_change c left join member m on m.workshop_id = c.workshop_id and m.id = c.member_id
     where c.lot_id = $1 order by c.changed_at desc, c.id desc`,
    [lotId],
  );
  return { items: rows.map((row) => ({ ...row, changedAt: row.changedAt.toISOString() })) };
}
