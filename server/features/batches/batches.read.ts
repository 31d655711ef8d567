import type { z } from 'zod';
import type { AnyBatchView, Mould } from '#shared/batches.ts';
import { familyOf, type Method } from '#shared/words/methods.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { notFound } from '#server/problem.ts';
import { FOUND_JSON, LOST_MINOR } from './outcome-sql.ts';

type Ingredients = (AnyBatchView & { seesQuantities: true })['ingredients'];
type BatchInRow = Omit<AnyBatchView & { seesQuantities: true }, 'createdAt' | 'updatedAt' | 'pouredAt' | 'family' | 'seesQuantities' | 'ingredients'> & {
  createdAt: Date;
  updatedAt: Date;
  pouredAt: Date | null;
  method: Method;
  ingredients: Ingredients;
};

const BATCH_SQL = `
  select b.id, b.version, b.created_at "createdAt", b.updated_at "updatedAt", b.code, b.made_on::text "madeOn", b.poured_at "pouredAt", b.method, b.state,
    b.formula_id "formulaId", f.name "formulaName", b.formula_version_id "formulaVersionId", v.number "formulaVersionNumber",
    b.maker_id "makerId", m.name "makerName", b.mould_id "mouldId", d.name "mouldName", b.bars, b.oil_mass_g "oilMassG",
    b.water_to_lye "waterToLye", b.lye_concentration_fraction "lyeConcentrationFraction",
    b.superfat_fraction "superfatFraction", b.superfat_weighed_fraction "superfatWeighedFraction",
    b.oil_temperature_c "oilTemperatureC", b.lye_temperature_c "lyeTemperatureC", b.batter_temperature_c "batterTemperatureC",
    b.scent_temperature_c "scentTemperatureC", b.room_temperature_c "roomTemperatureC", b.humidity_fraction "humidityFraction",
    b.blend_seconds "blendSeconds", b.trace_at_scent "traceAtScent", b.trace_at_pour "traceAtPour", b.minutes_to_pour "minutesToPour",
    b.cover, b.is_sprayed "isSprayed", b.gel, b.cook_temperature_c "cookTemperatureC", b.cook_minutes "cookMinutes", b.cook_loss_fraction "cookLossFraction",
    b.mould_hours "mouldHours", b.cut_hours "cutHours", b.unmoulded_on::text "unmouldedOn", b.cut_on::text "cutOn",
    b.fragrance_fraction "fragranceFraction", b.palette, b.has_embeds "hasEmbeds", b.note, b.hold_reason "holdReason",
    ${FOUND_JSON} found,
    coalesce((select array(select unnest(o.checked) except select unnest(o.found) order by 1)), '{}') clear,
    coalesce((select jsonb_agg(jsonb_build_object('kind', w.kind, 'bars', w.bars, 'fault', w.fault) order by w.created_at, w.id)
      from disposition w where w.workshop_id = b.workshop_id and w.batch_id = b.id), '[]') dispositions,
    ${LOST_MINOR} "lostMinor",
    coalesce((select jsonb_agg(jsonb_build_object('stage', c.stage, 'minutesFromStart', c.minutes_from_start) order by c.minutes_from_start, c.id)
      from cook_stage c where c.workshop_id = b.workshop_id and c.batch_id = b.id), '[]') "cookStages",
    coalesce((select jsonb_agg(jsonb_build_object('id', i.id, 'materialId', i.material_id, 'materialName', t.name, 'kind', t.kind,
        'lotId', i.lot_id, 'lotCode', l.code, 'lotStanding', l.standing, 'massG', i.mass_g, 'shareOfOilsFraction', i.share_of_oils_fraction) order by i.position, i.id)
      from batch_ingredient i
      join material t on t.workshop_id = i.workshop_id and t.id = i.material_id
      left join lot l on l.workshop_id = i.workshop_id and l.id = i.lot_id
      where i.workshop_id = b.workshop_id and i.batch_id = b.id), '[]') ingredients
  from batch b
  left join formula f on f.workshop_id = b.workshop_id and f.id = b.formula_id
  left join formula_version v on v.workshop_id = b.workshop_id and v.id = b.formula_version_id
  left join member m on m.workshop_id = b.workshop_id and m.id = b.maker_id
  left join mould d on d.workshop_id = b.workshop_id and d.id = b.mould_id
  left join batch_outcome o on o.workshop_id = b.workshop_id and o.batch_id = b.id
  where b.id = $1`;

async function batchRow(tx: WorkshopTransaction, batchId: string) {
  const row = await tx.row<BatchInRow>(BATCH_SQL, [batchId]);
  if (!row) throw notFound('batch');
  return {
    ...row,
    family: familyOf(row.method),
    createdAt: row.createdAt.toISOString(),
    updatedAt: row.updatedAt.toISOString(),
    pouredAt: row.pouredAt?.toISOString() ?? null,
  };
}

/** One batch as the member may see it: quantities only with the right to read formulas. @throws Problem 404 */
export async function readBatch(tx: WorkshopTransaction, batchId: string): Promise<AnyBatchView> {
  const row = await batchRow(tx, batchId);
  return tx.may('formula.read') ? { ...row, seesQuantities: true } : { ...row, seesQuantities: false };
}

/** One batch with all quantities, for those who write batches. @throws Problem 404 */
export async function readWholeBatch(tx: WorkshopTransaction, batchId: string): Promise<AnyBatchView & { seesQuantities: true }> {
  tx.require('formula.read');
  return { ...(await batchRow(tx, batchId)), seesQuantities: true };
}

/** Moulds in use, by name. */
export async function listMoulds(tx: WorkshopTransaction): Promise<{ items: z.input<typeof Mould>[] }> {
  const rows = await tx.rows<Omit<Mould, 'createdAt' | 'updatedAt'> & { createdAt: Date; updatedAt: Date }>(
    `select id, version, created_at "createdAt", updated_at "updatedAt", name, oil_mass_g "oilMassG", bars from mould where withdrawn_at is null order by name, id`,
  );
  return { items: rows.map((row) => ({ ...row, createdAt: row.createdAt.toISOString(), updatedAt: row.updatedAt.toISOString() })) };
}
