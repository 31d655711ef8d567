import type { z } from 'zod';
import type { BatchesChoice, BatchesFilter, BatchRow } from '#shared/batches.ts';
import { familyOf } from '#shared/words/methods.ts';
import { pageFrom, readCursor } from '#server/db/keyset.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { whereOf } from './log-filter.ts';
import { orderOf } from './log-order.ts';
import { FOUND_JSON, LOST_MINOR } from './outcome-sql.ts';

type Row = z.input<typeof BatchRow>;

/** Every batch has its outcome row from the moment it is logged, so an inner join loses none. */
const FROM = 'from batch b join batch_outcome o on o.workshop_id = b.workshop_id and o.batch_id = b.id';

/** A page of the log: one statement finds the page's ids along an index, one reads what is shown of them. */
export async function listBatches(tx: WorkshopTransaction, filter: BatchesFilter): Promise<{ items: Row[]; next: string | null }> {
  const { sql, parameters } = whereOf(filter);
  const { key, cast, kind, direction } = orderOf(filter);
  let after = 'true';
  if (filter.cursor) {
    const [lastKey, lastId] = readCursor(filter.cursor, [kind, 'uuid']);
    after = `(${key}, b.id) ${direction === 'asc' ? '>' : '<'} ($${parameters.push(lastKey)}::${cast}, $${parameters.push(lastId)}::uuid)`;
  }
  const statement = `select b.id, ${cast === 'date' ? `${key}::text` : key} "sortKey" ${FROM}
    where ${sql} and ${after} order by ${key} ${direction}, b.id ${direction} limit $${parameters.push(filter.limit + 1)}`;
  const ids = await tx.rows<{ id: string; sortKey: string | number | null }>(statement, parameters);
  const { items, next } = pageFrom(ids, filter.limit, (row) => [row.sortKey, row.id]);
  return { items: await rowsInOrder(tx, items.map(({ id }) => id)), next };
}

/** How many batches the filter finds, and how many there are. */
export async function countBatches(tx: WorkshopTransaction, filter: BatchesChoice): Promise<{ found: number; all: number }> {
  const { sql, parameters } = whereOf(filter);
  const all = await tx.row<{ count: number }>('select count(*)::int count from batch');
  if (parameters.length === 0 && sql === 'true') return { found: all?.count ?? 0, all: all?.count ?? 0 };
  const statement = `select count(*)::int count ${FROM} where ${sql}`;
  const found = await tx.row<{ count: number }>(statement, parameters);
  return { found: found?.count ?? 0, all: all?.count ?? 0 };
}

const ROWS_SQL = `
  select b.id, b.version, b.code, b.made_on::text "madeOn", b.method, b.state, f.name "formulaName", m.name "makerName", d.name "mouldName",
    b.water_to_lye "waterToLye", b.oil_temperature_c "oilTemperatureC", b.fragrance_fraction "fragranceFraction", b.bars, b.palette,
    coalesce((select jsonb_agg(jsonb_build_object('lotId', l.id, 'code', l.code, 'materialName', t.name, 'kind', t.kind, 'standing', l.standing)
        order by t.kind <> 'fragrance', i.position, i.id)
      from batch_ingredient i
      join lot l on l.workshop_id = i.workshop_id and l.id = i.lot_id
      join material t on t.workshop_id = i.workshop_id and t.id = i.material_id
      where i.workshop_id = b.workshop_id and i.batch_id = b.id), '[]') lots,
    ${FOUND_JSON} found,
    coalesce((select array(select unnest(o.checked) except select unnest(o.found) order by 1)), '{}') clear,
    coalesce((select jsonb_agg(jsonb_build_object('kind', w.kind, 'bars', w.bars) order by w.kind)
      from (select kind, sum(bars)::int bars from disposition w where w.workshop_id = b.workshop_id and w.batch_id = b.id group by kind) w), '[]') dispositions,
    ${LOST_MINOR} "lostMinor",
    (select p.id from photo p where p.workshop_id = b.workshop_id and p.batch_id = b.id
      order by (p.stage = 'cut') desc nulls last, p.taken_at desc nulls last, p.id desc limit 1) "coverPhotoId"
  from batch b
  left join formula f on f.workshop_id = b.workshop_id and f.id = b.formula_id
  left join member m on m.workshop_id = b.workshop_id and m.id = b.maker_id
  left join mould d on d.workshop_id = b.workshop_id and d.id = b.mould_id
  left join batch_outcome o on o.workshop_id = b.workshop_id and o.batch_id = b.id
  where b.id = any($1::uuid[])`;

async function rowsInOrder(tx: WorkshopTransaction, ids: readonly string[]): Promise<Row[]> {
  if (ids.length === 0) return [];
  const rows = await tx.rows<Omit<Row, 'family'>>(ROWS_SQL, [ids]);
  const byId = new Map(rows.map((row) => [row.id, row]));
  return ids.flatMap((id) => {
    const row = byId.get(id);
    return row ? [{ ...row, family: familyOf(row.method) }] : [];
  });
}
