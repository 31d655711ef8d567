import type { BatchesChoice } from '#shared/batches.ts';
import type { BatchHistoryRow } from '#shared/batch-history.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { whereOf } from './log-filter.ts';
import { orderOf } from './log-order.ts';

/** Rows fetched at once: some 200 KB. */
const PAGE = 500;

/** The batches of a filter in its order, page by page through a cursor; never a quantity of a formula. */
export async function* batchHistoryPages(tx: WorkshopTransaction, filter: BatchesChoice): AsyncGenerator<BatchHistoryRow[]> {
  const { sql, parameters } = whereOf(filter);
  const { key, direction } = orderOf(filter);
  const statement = `declare batch_history no scroll cursor for
    select b.code, b.made_on::text "madeOn", b.method, f.name "formulaName", m.name "makerName", d.name "mouldName",
      b.oil_temperature_c "oilTemperatureC", b.lye_temperature_c "lyeTemperatureC", b.room_temperature_c "roomTemperatureC", b.humidity_fraction "humidityFraction",
      b.water_to_lye "waterToLye", b.lye_concentration_fraction "lyeConcentrationFraction", b.superfat_fraction "superfatFraction", b.fragrance_fraction "fragranceFraction",
      coalesce((select array_agg(l.code order by i.position, i.id) from batch_ingredient i
        join lot l on l.workshop_id = i.workshop_id and l.id = i.lot_id join material t on t.workshop_id = i.workshop_id and t.id = i.material_id
        where i.workshop_id = b.workshop_id and i.batch_id = b.id and t.kind = 'fragrance'), '{}') "fragranceLots",
      coalesce((select array_agg(t.name order by i.position, i.id) from batch_ingredient i
        join material t on t.workshop_id = i.workshop_id and t.id = i.material_id
        where i.workshop_id = b.workshop_id and i.batch_id = b.id and t.kind = 'colourant'), '{}') colourants,
      b.gel, b.blend_seconds "blendSeconds", b.cut_hours "cutHours", b.bars, b.note, o.outcomes
    from batch b
    join batch_outcome o on o.workshop_id = b.workshop_id and o.batch_id = b.id
    left join formula f on f.workshop_id = b.workshop_id and f.id = b.formula_id
    left join member m on m.workshop_id = b.workshop_id and m.id = b.maker_id
    left join mould d on d.workshop_id = b.workshop_id and d.id = b.mould_id
    where ${sql} order by ${key} ${direction}, b.id ${direction}`;
  await tx.rows(statement, parameters);
  const fetchPage = `fetch ${PAGE} from batch_history`;
  for (;;) {
    const rows = await tx.rows<BatchHistoryRow>(fetchPage);
    if (rows.length > 0) yield rows;
    if (rows.length < PAGE) break;
  }
}
