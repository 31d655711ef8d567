import { addDays } from '#shared/units/days.ts';
import { usedByLot } from './lots.ts';
import type { HistoryBatch, HistoryFormula, HistoryLot, HistoryMould, HistoryPerson, HistorySupplier } from './types.ts';

export const saltmarshPeople: HistoryPerson[] = [
  { key: 'maren', name: 'Maren Tolsvik-Ash', email: 'maren@saltmarshkettle.example', role: 'owner' },
  { key: 'jory', name: 'Jory Pennaway', email: 'jory@saltmarshkettle.example', role: 'maker' },
];

export const saltmarshSuppliers: HistorySupplier[] = [
  { key: 'merrowby', name: 'Merrowby Scents', contactName: 'Odile Farrant', email: 'odile@merrowby.example' },
  { key: 'lanternhill', name: 'Lantern Hill Oils', contactName: 'Piet Haverloe', email: 'orders@lanternhill.example' },
];

export const saltmarshMoulds: HistoryMould[] = [{ key: 'K1', name: 'Kettle loaf', oilMassG: 1200, bars: 14 }];

export const saltmarshFormulas: HistoryFormula[] = [
  {
    key: 'shore', name: 'Shore', versions: [{
      number: 1, superfatFraction: 0.05,
      lines: [{ material: 'olive', shareOfOils: 0.5 }, { material: 'coconut', shareOfOils: 0.28 }, { material: 'shea', shareOfOils: 0.12 }, { material: 'castor', shareOfOils: 0.1 }],
    }],
  },
];

interface Plan { code: string; material: string; supplier: string; priceMinorPerKg: number; receivedDaysAgo: number }

const plans: Plan[] = [
  { code: 'M-0098', material: 'samphire', supplier: 'merrowby', priceMinorPerKg: 5700, receivedDaysAgo: 260 },
  { code: 'M-0113', material: 'samphire', supplier: 'merrowby', priceMinorPerKg: 5800, receivedDaysAgo: 120 },
  { code: 'M-0105', material: 'tarred-rope', supplier: 'merrowby', priceMinorPerKg: 6900, receivedDaysAgo: 255 },
  { code: 'LH-31', material: 'olive', supplier: 'lanternhill', priceMinorPerKg: 760, receivedDaysAgo: 265 },
  { code: 'LH-32', material: 'coconut', supplier: 'lanternhill', priceMinorPerKg: 430, receivedDaysAgo: 265 },
  { code: 'LH-36', material: 'shea', supplier: 'lanternhill', priceMinorPerKg: 990, receivedDaysAgo: 265 },
  { code: 'LH-37', material: 'castor', supplier: 'lanternhill', priceMinorPerKg: 720, receivedDaysAgo: 265 },
  { code: 'LH-40', material: 'naoh', supplier: 'lanternhill', priceMinorPerKg: 420, receivedDaysAgo: 265 },
];

const isScent = (plan: Plan) => plan.supplier === 'merrowby';

export function saltmarshLots(today: string, batches: readonly HistoryBatch[]): HistoryLot[] {
  const used = usedByLot(batches);
  return plans.map((plan): HistoryLot => {
    const receivedOn = addDays(today, -plan.receivedDaysAgo);
    const usedG = used.get(plan.code) ?? 0;
    const quantityG = Math.ceil((usedG * 1.05 + 200) / 500) * 500;
    return {
      code: plan.code, material: plan.material, supplier: plan.supplier, orderedOn: addDays(receivedOn, -7), receivedOn, openedOn: addDays(receivedOn, 3),
      bestBeforeOn: addDays(receivedOn, 540), quantityG, quantityLeftG: Math.round(quantityG - usedG), priceMinorPerKg: plan.priceMinorPerKg,
      ...(plan.material === 'naoh' ? { purityFraction: 0.985 } : {}),
      ...(isScent(plan) ? { certificateMaxFraction: 0.061, certificateEdition: '51st amendment', certificateOn: addDays(receivedOn, -90), flashPointC: 79, vanillinFraction: 0 } : {}),
      standing: 'in-use', standingChanges: [],
    };
  });
}
