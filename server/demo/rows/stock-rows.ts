import { addDays } from '#shared/units/days.ts';
import type { HistoryLot, WorkshopHistory } from '../history/types.ts';
import { idAt, type Keys, type TableRows } from './keys.ts';

const morning = (day: string) => `${day}T08:00:00Z`;

/** Rows of all that stands in the store before the first batch: suppliers, materials, lots, formulas, moulds. */
export function stockRows(history: WorkshopHistory, keys: Keys): TableRows[] {
  const opened = morning(addDays(history.startsOn, -60));
  const at = { created_at: opened, updated_at: opened };
  const suppliers = history.suppliers.map((s) => ({
    id: keys.make('supplier', s.key, opened), name: s.name, contact_name: s.contactName, email: s.email, phone: s.phone ?? null, note: s.note ?? null, ...at,
  }));
  const materials = history.materials.map((m) => ({
    id: keys.make('material', m.key, opened), kind: m.kind, name: m.name, inci_name: m.inciName ?? null, saponification_koh_mg_per_g: m.saponificationKohMgPerG ?? null,
    is_hard_fat: m.isHardFat ?? false, is_lauric: m.isLauric ?? false, is_animal: m.isAnimal ?? false, is_linoleic_rich: m.isLinoleicRich ?? false,
    alkali: m.alkali ?? null, is_essential_oil: m.isEssentialOil ?? false, is_white_pigment: m.isWhitePigment ?? false, note: m.note ?? null, ...at,
  }));
  const moulds = history.moulds.map((m) => ({ id: keys.make('mould', m.key, opened), name: m.name, oil_mass_g: m.oilMassG, bars: m.bars, ...at }));
  const formulas = history.formulas.map((f) => ({ id: keys.make('formula', f.key, opened), name: f.name, note: f.note ?? null, ...at }));
  const versions = history.formulas.flatMap((f) => f.versions.map((v) => ({
    id: keys.make('version', `${f.key} ${v.number}`, opened), formula_id: keys.of('formula', f.key), number: v.number, superfat_fraction: v.superfatFraction,
    note: v.note ?? null, frozen_at: frozenAt(history, f.key, v.number), created_at: opened,
  })));
  const lines = history.formulas.flatMap((f) => f.versions.flatMap((v) => v.lines.map((line, position) => ({
    id: idAt(opened), formula_version_id: keys.of('version', `${f.key} ${v.number}`), material_id: keys.of('material', line.material),
    share_of_oils_fraction: line.shareOfOils, position,
  }))));
  return [
    { table: 'supplier', rows: suppliers }, { table: 'material', rows: materials }, { table: 'mould', rows: moulds },
    { table: 'lot', rows: history.lots.map((lot) => lotRow(lot, keys)) },
    { table: 'lot_standing_change', rows: history.lots.flatMap((lot) => standingRows(lot, keys)) },
    { table: 'formula', rows: formulas }, { table: 'formula_version', rows: versions }, { table: 'formula_line', rows: lines },
  ];
}

/** A version never changes from the moment a batch first used it. */
function frozenAt(history: WorkshopHistory, formula: string, number: number): string | null {
  const first = history.batches.find((b) => b.inputs.formula === formula && b.inputs.formulaVersion === number && b.state !== 'planned');
  return first ? morning(first.madeOn) : null;
}

function lotRow(lot: HistoryLot, keys: Keys): Record<string, unknown> {
  const received = morning(lot.receivedOn);
  const last = lot.standingChanges.at(-1)?.on;
  return {
    id: keys.make('lot', lot.code, received), version: 1 + lot.standingChanges.length, material_id: keys.of('material', lot.material), supplier_id: keys.of('supplier', lot.supplier),
    code: lot.code, supplier_product_name: lot.productName ?? null, supplier_product_number: lot.productNumber ?? null,
    ordered_on: lot.orderedOn, received_on: lot.receivedOn, opened_on: lot.openedOn ?? null, finished_on: lot.finishedOn ?? null, best_before_on: lot.bestBeforeOn ?? null,
    quantity_g: lot.quantityG, quantity_left_g: lot.quantityLeftG, price_minor_per_kg: lot.priceMinorPerKg, purity_fraction: lot.purityFraction ?? null,
    certificate_max_fraction: lot.certificateMaxFraction ?? null, certificate_edition: lot.certificateEdition ?? null, certificate_on: lot.certificateOn ?? null,
    flash_point_c: lot.flashPointC ?? null, vanillin_fraction: lot.vanillinFraction ?? null, intended_use_note: lot.intendedUseNote ?? null, storage: lot.storage ?? null,
    standing: lot.standing, note: lot.note ?? null, created_at: received, updated_at: last ? morning(last) : received,
  };
}

function standingRows(lot: HistoryLot, keys: Keys): Record<string, unknown>[] {
  return lot.standingChanges.map((change) => ({
    id: idAt(morning(change.on)), lot_id: keys.of('lot', lot.code), before: change.before, after: change.after, reason: change.reason,
    member_id: keys.of('member', change.by), changed_at: morning(change.on),
  }));
}
