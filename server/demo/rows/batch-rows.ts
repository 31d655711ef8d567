import type { HistoryBatch, WorkshopHistory } from '../history/types.ts';
import { idAt, type Keys, type TableRows } from './keys.ts';

/** Rows of the batches themselves: what went in, how they were cooked, where their bars went. */
export function batchRows(history: WorkshopHistory, keys: Keys): TableRows[] {
  return [
    { table: 'batch', rows: history.batches.map((batch) => batchRow(batch, keys)) },
    { table: 'batch_ingredient', rows: history.batches.flatMap((batch) => ingredientRows(batch, keys)) },
    { table: 'cook_stage', rows: history.batches.flatMap((batch) => cookRows(batch, keys)) },
    { table: 'disposition', rows: history.batches.flatMap((batch) => dispositionRows(batch, keys)) },
  ];
}

/** Moment at which a batch came into the log; what is only planned came in when the day before ended. */
function writtenAt(batch: HistoryBatch): string {
  return batch.pouredAt ?? `${batch.madeOn}T00:00:00Z`;
}

function batchRow(batch: HistoryBatch, keys: Keys): Record<string, unknown> {
  const { inputs } = batch;
  const at = writtenAt(batch);
  const isMade = batch.state !== 'planned' && batch.state !== 'making';
  /** Only what was really read or done; a plan has no temperatures yet. */
  const once = <T>(value: T): T | null => (isMade ? value : null);
  return {
    id: keys.make('batch', batch.code, at), code: batch.code, made_on: batch.madeOn, poured_at: batch.pouredAt, method: inputs.method, state: batch.state,
    formula_id: keys.of('formula', inputs.formula), formula_version_id: keys.of('version', `${inputs.formula} ${inputs.formulaVersion}`),
    maker_id: keys.of('member', inputs.maker), mould_id: keys.of('mould', inputs.mould), bars: inputs.bars, oil_mass_g: inputs.oilMassG,
    water_to_lye: inputs.waterToLye, superfat_fraction: inputs.superfatFraction, superfat_weighed_fraction: once(inputs.superfatWeighedFraction),
    oil_temperature_c: once(inputs.oilTemperatureC), lye_temperature_c: once(inputs.lyeTemperatureC), batter_temperature_c: once(inputs.batterTemperatureC),
    scent_temperature_c: once(inputs.scentTemperatureC), room_temperature_c: once(inputs.roomTemperatureC), humidity_fraction: once(inputs.humidityFraction),
    blend_seconds: once(inputs.blendSeconds), trace_at_scent: inputs.traceAtScent, trace_at_pour: inputs.traceAtPour, minutes_to_pour: inputs.minutesToPour,
    cover: once(inputs.cover), is_sprayed: once(inputs.isSprayed), gel: batch.unmouldedOn === null ? null : inputs.gel,
    cook_temperature_c: once(inputs.cookTemperatureC), cook_minutes: once(inputs.cookMinutes), cook_loss_fraction: once(inputs.cookLossFraction),
    mould_hours: batch.unmouldedOn === null ? null : inputs.mouldHours, cut_hours: batch.cutOn === null ? null : inputs.cutHours,
    unmoulded_on: batch.unmouldedOn, cut_on: batch.cutOn, fragrance_fraction: inputs.fragranceFraction, palette: inputs.palette, has_embeds: inputs.hasEmbeds,
    note: batch.note, hold_reason: batch.holdReason ?? null, created_at: at, updated_at: batch.inspections.at(-1)?.at ?? at,
  };
}

function ingredientRows(batch: HistoryBatch, keys: Keys): Record<string, unknown>[] {
  return batch.inputs.ingredients.map((line, position) => ({
    id: idAt(writtenAt(batch)), batch_id: keys.of('batch', batch.code), material_id: keys.of('material', line.material),
    lot_id: line.lot === null ? null : keys.of('lot', line.lot), mass_g: line.massG, share_of_oils_fraction: line.shareOfOils, position,
  }));
}

function cookRows(batch: HistoryBatch, keys: Keys): Record<string, unknown>[] {
  if (batch.state === 'planned') return [];
  return batch.inputs.cookStages.map((cook) => ({
    id: idAt(writtenAt(batch)), batch_id: keys.of('batch', batch.code), stage: cook.stage, minutes_from_start: cook.minutesFromStart,
  }));
}

function dispositionRows(batch: HistoryBatch, keys: Keys): Record<string, unknown>[] {
  const at = batch.inspections.at(-1)?.at ?? writtenAt(batch);
  return batch.dispositions.map((way) => ({
    id: idAt(at), batch_id: keys.of('batch', batch.code), kind: way.kind, bars: way.bars, fault: way.fault, note: way.note ?? null, created_at: at, updated_at: at,
  }));
}
