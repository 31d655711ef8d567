import type { CausesFilter } from '#shared/causes.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import type { BatchFacts } from './batch-facts.ts';

/** Rows fetched at once: some 1 MB, handed on before the next are asked for. */
const PAGE = 1000;

/** What the workshop's answers rest on; it rises with every change of a batch, what went in, a lot or a finding. */
export async function dataRevision(tx: WorkshopTransaction): Promise<number> {
  const row = await tx.row<{ revision: string }>('select revision::text from data_revision where workshop_id = $1', [tx.workshopId]);
  return Number(row?.revision ?? 0);
}

const heldOf = (kind: string, column: string) => `array_agg(distinct ${column}) filter (where t.kind = '${kind}' and ${column} is not null)`;

const STATEMENT = `declare batch_facts no scroll cursor for
  select b.id, b.code, b.made_on::text "madeOn", b.method, b.state, b.formula_id formula, b.maker_id maker, b.mould_id mould,
    b.cover, b.gel, b.trace_at_pour trace, b.is_sprayed "isSprayed", b.has_embeds "hasEmbeds",
    b.water_to_lye "waterToLye", coalesce(b.superfat_weighed_fraction, b.superfat_fraction) superfat, b.oil_temperature_c "oilTemperatureC", b.lye_temperature_c "lyeTemperatureC",
    b.scent_temperature_c "scentTemperatureC", b.room_temperature_c "roomTemperatureC", b.humidity_fraction humidity, b.blend_seconds "blendSeconds",
    b.cook_minutes "cookMinutes", b.mould_hours "mouldHours", b.cut_hours "cutHours", coalesce(b.fragrance_fraction, i.load) fragrance,
    case when coalesce(i."hasUnknownVanillin", b.fragrance_fraction > 0 and not coalesce(i."hasFragrance", false)) then null else coalesce(i.vanillin, 0) end vanillin,
    i.batch_id is not null "hasLines", coalesce(i."hasFragrance", b.fragrance_fraction > 0, false) "hasFragrance",
    i."fragranceLots", i."fatLots", i."alkaliLots", i."colourantLots", i.colourants, i.additives, i.liquids, coalesce(o.outcomes, '{}') outcomes
  from batch b
  left join batch_outcome o on o.workshop_id = b.workshop_id and o.batch_id = b.id
  left join (
    select g.workshop_id, g.batch_id,
      ${heldOf('fragrance', 'g.lot_id')} "fragranceLots", ${heldOf('fat', 'g.lot_id')} "fatLots", ${heldOf('alkali', 'g.lot_id')} "alkaliLots",
      ${heldOf('colourant', 'g.lot_id')} "colourantLots", ${heldOf('colourant', 'g.material_id')} colourants, ${heldOf('additive', 'g.material_id')} additives,
      ${heldOf('liquid', 'g.material_id')} liquids,
      coalesce(bool_or(t.kind = 'fragrance'), false) "hasFragrance",
      sum(g.share_of_oils_fraction) filter (where t.kind = 'fragrance') load,
      sum(g.share_of_oils_fraction * l.vanillin_fraction) filter (where t.kind = 'fragrance') vanillin,
      coalesce(bool_or(t.kind = 'fragrance' and (l.vanillin_fraction is null or g.share_of_oils_fraction is null)), false) "hasUnknownVanillin"
    from batch_ingredient g
    join material t on t.workshop_id = g.workshop_id and t.id = g.material_id
    left join lot l on l.workshop_id = g.workshop_id and l.id = g.lot_id
    group by g.workshop_id, g.batch_id
  ) i on i.workshop_id = b.workshop_id and i.batch_id = b.id
  where ($1::date is null or b.made_on >= $1) and ($2::date is null or b.made_on <= $2)
    and ($3::text[] is null or b.method = any($3)) and ($4::uuid is null or b.formula_id = $4)`;

/** Every batch of the filter with what went in and what was found, one row a batch, in pages of one statement. */
export async function* batchFacts(tx: WorkshopTransaction, filter: CausesFilter): AsyncGenerator<BatchFacts[]> {
  const methods = filter.family === undefined ? null : filter.family === 'hot' ? ['hot', 'hot-fluid'] : ['cold', 'cold-oven'];
  await tx.rows(STATEMENT, [filter.from ?? null, filter.to ?? null, methods, filter.formula ?? null]);
  const fetchPage = `fetch ${PAGE} from batch_facts`;
  for (;;) {
    const rows = await tx.rows<BatchFacts>(fetchPage);
    if (rows.length > 0) yield rows;
    if (rows.length < PAGE) break;
  }
  await tx.rows('close batch_facts');
}
