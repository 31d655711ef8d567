import { addDays } from '#shared/units/days.ts';
import type { LotStanding } from '#shared/words/lot-words.ts';
import { weekOf } from './calendar.ts';
import { quernbyScentLots, type ScentLot } from './quernby-scent-lots.ts';
import { quernbyStandings } from './standings.ts';
import { quernbyStockLots, type StockLot } from './stock-lots.ts';
import type { HistoryBatch, HistoryLot } from './types.ts';

const productNames: Readonly<Record<string, string>> = {
  'ember-fig': 'Fig & Ember', tideflat: 'Tide Flat', bakehouse: 'Bake House No. 3', 'lime-shrub': 'Lime Shrub', 'hedgerow-lavender': 'Lavender, hedgerow type',
  'loft-amber': 'Amber Loft', 'clove-stove': 'Clove Bud Accord', 'arbour-rose': 'Rose Arbour',
};

/** Grams drawn from each lot by the batches that were really weighed. */
export function usedByLot(batches: readonly HistoryBatch[]): Map<string, number> {
  const used = new Map<string, number>();
  for (const batch of batches) {
    if (batch.state === 'planned') continue;
    for (const { lot, massG } of batch.inputs.ingredients) if (lot) used.set(lot, (used.get(lot) ?? 0) + massG);
  }
  return used;
}

/** Every lot of the first workshop, with what is left of it and how its standing came about. */
export function quernbyLots(startsOn: string, batches: readonly HistoryBatch[]): HistoryLot[] {
  const used = usedByLot(batches);
  return [
    ...quernbyScentLots.map((lot) => scentLot(lot, startsOn, used.get(lot.code) ?? 0)),
    ...quernbyStockLots.map((lot) => stockLot(lot, startsOn, used.get(lot.code) ?? 0)),
  ];
}

/** Left of the lot that the claim is about, in grams. */
const badLotLeftG = 1100;

function scentLot(lot: ScentLot, startsOn: string, usedG: number): HistoryLot {
  const last = Math.max(lot.cold.weeks[1], lot.hot.weeks[1]);
  const first = Math.min(lot.cold.count > 0 ? lot.cold.weeks[0] : 999, lot.hot.count > 0 ? lot.hot.weeks[0] : 999);
  const standingChanges = quernbyStandings(lot.code, startsOn);
  const isUp = standingChanges.length === 0 && last < 85;
  const quantityG = lot.code === 'EF-7802' ? Math.ceil((usedG + badLotLeftG) / 50) * 50 : bottles(usedG);
  const received = weekOf(startsOn, lot.receivedInWeek);
  const standing: LotStanding = isUp ? 'used-up' : (standingChanges.at(-1)?.after ?? 'in-use');
  const finishedOn = weekOf(startsOn, last + 1);
  return {
    code: lot.code, material: lot.scent, supplier: lot.supplier, productName: productNames[lot.scent] ?? lot.scent, productNumber: lot.productNumber,
    orderedOn: addDays(received, -9), receivedOn: received, openedOn: addDays(weekOf(startsOn, first), -1), bestBeforeOn: weekOf(startsOn, lot.bestBeforeInWeek),
    ...(isUp ? { finishedOn } : {}),
    quantityG, quantityLeftG: lot.code === 'EF-7802' ? badLotLeftG : isUp ? 0 : Math.round(quantityG - usedG),
    priceMinorPerKg: lot.priceMinorPerKg, flashPointC: lot.flashPointC, vanillinFraction: lot.vanillinFraction,
    ...(lot.certificateMaxFraction === undefined ? {} : { certificateMaxFraction: lot.certificateMaxFraction, certificateEdition: '51st amendment', certificateOn: addDays(received, -60) }),
    ...(lot.intendedUseNote ? { intendedUseNote: lot.intendedUseNote } : {}),
    storage: 'Aluminium flask, cupboard in the north room', standing,
    standingChanges: isUp ? [{ on: finishedOn, by: 'ilse', before: 'in-use', after: 'used-up', reason: 'Bottle empty.' }] : standingChanges,
  };
}

function stockLot(lot: StockLot, startsOn: string, usedG: number): HistoryLot {
  const [first, last] = lot.weeks;
  const isUp = last < 104;
  const opened = weekOf(startsOn, lot.openedInWeek ?? first);
  const received = addDays(opened, first === 1 ? -20 : -12);
  const quantityG = Math.max(1000, Math.ceil((usedG * 1.06 + 400) / 1000) * 1000);
  const finishedOn = weekOf(startsOn, last + 1);
  return {
    code: lot.code, material: lot.material, supplier: lot.supplier, orderedOn: addDays(received, -6), receivedOn: received, openedOn: opened,
    ...(isUp ? { finishedOn } : {}), bestBeforeOn: lot.bestBeforeInWeek === undefined ? addDays(received, lot.material === 'naoh' ? 1095 : 540) : weekOf(startsOn, lot.bestBeforeInWeek),
    quantityG, quantityLeftG: isUp ? 0 : Math.max(0, Math.round(quantityG - usedG)), priceMinorPerKg: lot.priceMinorPerKg,
    ...(lot.purityFraction === undefined ? {} : { purityFraction: lot.purityFraction }), ...(lot.note ? { note: lot.note } : {}),
    standing: isUp ? 'used-up' : 'in-use',
    standingChanges: isUp ? [{ on: finishedOn, by: 'ilse', before: 'in-use', after: 'used-up', reason: 'Drum empty.' }] : [],
  };
}

/** Bottles of half a kilo, at least one, with a little over. */
function bottles(usedG: number): number {
  return Math.max(1, Math.ceil((usedG * 1.05 + 20) / 500)) * 500;
}
