/** A lot of anything but scent: from which week to which the workshop took from it. */
export interface StockLot {
  code: string;
  material: string;
  supplier: string;
  weeks: [number, number];
  priceMinorPerKg: number;
  /** Weeks of the story in which it was opened and best before ended, where they matter. */
  openedInWeek?: number;
  bestBeforeInWeek?: number;
  purityFraction?: number;
  /** Only taken when the story says so. */
  byHand?: true;
  note?: string;
}

/** Consecutive lots of one material: each is in use until the week before the next starts. */
function row(material: string, supplier: string, priceMinorPerKg: number, lots: readonly (readonly [string, number])[], more: Partial<StockLot> = {}): StockLot[] {
  return lots.map(([code, first], n) => ({
    code, material, supplier, priceMinorPerKg, weeks: [first, (lots[n + 1]?.[1] ?? 105) - 1] as [number, number], ...more,
  }));
}

export const quernbyStockLots: StockLot[] = [
  ...row('olive', 'hexley', 720, [['OL-4410', 1], ['OL-4467', 23], ['OL-4530', 48], ['OL-4598', 76]]),
  ...row('coconut', 'hexley', 410, [['CO-915', 1], ['CO-958', 41], ['CO-990', 81]]),
  ...row('shea', 'hexley', 950, [['HT-208', 1], ['HT-301', 35], ['HT-344', 73]]),
  ...row('castor', 'hexley', 680, [['CR-77', 1], ['CR-91', 61]]),
  ...row('rapeseed', 'hexley', 290, [['RP-310', 1], ['RP-352', 34], ['RP-388', 71]]),
  ...row('tallow', 'hexley', 520, [['TL-55', 1], ['TL-61', 36], ['TL-70', 72]]),
  ...row('palm', 'hexley', 330, [['PO-601', 1], ['PO-640', 53]]),
  ...row('sunflower', 'hexley', 340, [['SU-771', 1], ['SU-815', 29], ['SU-852', 56]]),
  {
    code: 'SU-884', material: 'sunflower', supplier: 'hexley', weeks: [60, 78], priceMinorPerKg: 310, openedInWeek: 12, bestBeforeInWeek: 64, byHand: true,
    note: 'Drum stood opened under the stairs for eleven months before anybody took from it.',
  },
  ...row('sunflower-ho', 'hexley', 420, [['SH-120', 79]]),
  ...row('naoh', 'paleharbour', 390, [['PH-5320', 1], ['PH-5512', 39], ['PH-5688', 79]], { purityFraction: 0.985 }),
  ...row('titanium-dioxide', 'dunmarrow', 2600, [['DC-77', 1]]),
  ...row('charcoal', 'dunmarrow', 3100, [['DC-40', 1], ['DC-52', 60]]),
  ...row('mica-pearl', 'dunmarrow', 4800, [['DC-58', 1]]),
  ...row('ultramarine', 'dunmarrow', 2900, [['DC-23', 1], ['DC-66', 55]]),
  ...row('red-clay', 'dunmarrow', 1900, [['DC-31', 1], ['DC-69', 58]]),
  ...row('green-oxide', 'dunmarrow', 3400, [['DC-36', 1]]),
  ...row('salt', 'hexley', 110, [['ST-9', 1], ['ST-12', 57]]),
  ...row('honey', 'hexley', 1250, [['HN-3', 1], ['HN-4', 50]]),
  ...row('oat', 'hexley', 380, [['OT-12', 1], ['OT-15', 62]]),
  ...row('goat-milk', 'hexley', 460, [['GM-08', 1], ['GM-11', 27], ['GM-14', 53], ['GM-17', 79]]),
  ...row('sodium-lactate', 'dunmarrow', 900, [['SL-8', 1], ['SL-10', 65]]),
];

/** The lot in ordinary use in a week; null for what has none, such as water. */
export function lotInWeek(material: string, week: number): string | null {
  const lot = quernbyStockLots.find((l) => l.material === material && !l.byHand && week >= l.weeks[0] && week <= l.weeks[1]);
  return lot?.code ?? null;
}
