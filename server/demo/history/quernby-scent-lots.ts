/** One fragrance lot of the story: when it was poured, how often, and what its paper says. */
export interface ScentLot {
  code: string;
  scent: string;
  supplier: 'aldersyke' | 'corvane';
  /** Weeks of use, first and last, per family of methods. */
  cold: { weeks: [number, number]; count: number; byTomasz?: number };
  hot: { weeks: [number, number]; count: number; onlyPriya?: boolean };
  /** Weeks in which the lot stood still. */
  notInWeeks?: [number, number];
  vanillinFraction: number;
  certificateMaxFraction?: number;
  flashPointC: number;
  priceMinorPerKg: number;
  productNumber: string;
  receivedInWeek: number;
  bestBeforeInWeek: number;
  intendedUseNote?: string;
}

const alike = (first: number, last: number, cold: number, hot: number): Pick<ScentLot, 'cold' | 'hot'> =>
  ({ cold: { weeks: [first, last], count: cold }, hot: { weeks: [first, last], count: hot } });

export const quernbyScentLots: ScentLot[] = [
  { code: 'EF-7731', scent: 'ember-fig', supplier: 'aldersyke', ...alike(1, 23, 9, 3), vanillinFraction: 0.01, certificateMaxFraction: 0.052, flashPointC: 88, priceMinorPerKg: 6200, productNumber: 'AS 1147', receivedInWeek: -3, bestBeforeInWeek: 75 },
  {
    code: 'EF-7802', scent: 'ember-fig', supplier: 'aldersyke',
    cold: { weeks: [24, 38], count: 10, byTomasz: 8 }, hot: { weeks: [28, 50], count: 6 },
    vanillinFraction: 0.01, certificateMaxFraction: 0.052, flashPointC: 88, priceMinorPerKg: 6350, productNumber: 'AS 1147', receivedInWeek: 22, bestBeforeInWeek: 100,
    intendedUseNote: 'Suits cold and hot process.',
  },
  { code: 'EF-7860', scent: 'ember-fig', supplier: 'aldersyke', ...alike(51, 104, 12, 4), vanillinFraction: 0.01, certificateMaxFraction: 0.052, flashPointC: 88, priceMinorPerKg: 6350, productNumber: 'AS 1147', receivedInWeek: 49, bestBeforeInWeek: 128 },
  { code: 'TF-2204', scent: 'tideflat', supplier: 'aldersyke', cold: { weeks: [1, 52], count: 12, byTomasz: 7 }, hot: { weeks: [1, 52], count: 3 }, vanillinFraction: 0, certificateMaxFraction: 0.084, flashPointC: 76, priceMinorPerKg: 5400, productNumber: 'AS 0932', receivedInWeek: -5, bestBeforeInWeek: 70 },
  { code: 'TF-2251', scent: 'tideflat', supplier: 'aldersyke', ...alike(53, 104, 10, 3), vanillinFraction: 0, certificateMaxFraction: 0.084, flashPointC: 76, priceMinorPerKg: 5550, productNumber: 'AS 0932', receivedInWeek: 51, bestBeforeInWeek: 126 },
  { code: 'BK-0415', scent: 'bakehouse', supplier: 'corvane', ...alike(1, 55, 9, 3), vanillinFraction: 0.09, certificateMaxFraction: 0.029, flashPointC: 94, priceMinorPerKg: 4800, productNumber: 'C-4471', receivedInWeek: -2, bestBeforeInWeek: 76, intendedUseNote: 'Turns brown in soap.' },
  { code: 'BK-0459', scent: 'bakehouse', supplier: 'corvane', ...alike(56, 104, 8, 3), vanillinFraction: 0.12, certificateMaxFraction: 0.029, flashPointC: 94, priceMinorPerKg: 4950, productNumber: 'C-4471', receivedInWeek: 54, bestBeforeInWeek: 130, intendedUseNote: 'Turns brown in soap.' },
  { code: 'LS-3310', scent: 'lime-shrub', supplier: 'corvane', ...alike(1, 50, 6, 6), vanillinFraction: 0, certificateMaxFraction: 0.06, flashPointC: 62, priceMinorPerKg: 5900, productNumber: 'C-2018', receivedInWeek: -4, bestBeforeInWeek: 52 },
  { code: 'LS-3365', scent: 'lime-shrub', supplier: 'corvane', ...alike(51, 104, 7, 6), vanillinFraction: 0, certificateMaxFraction: 0.06, flashPointC: 62, priceMinorPerKg: 6100, productNumber: 'C-2018', receivedInWeek: 49, bestBeforeInWeek: 108 },
  { code: 'HL-1102', scent: 'hedgerow-lavender', supplier: 'aldersyke', ...alike(1, 104, 24, 3), vanillinFraction: 0, certificateMaxFraction: 0.12, flashPointC: 74, priceMinorPerKg: 8800, productNumber: 'AS 0210', receivedInWeek: -6, bestBeforeInWeek: 122 },
  { code: 'LA-5560', scent: 'loft-amber', supplier: 'aldersyke', ...alike(20, 82, 6, 2), vanillinFraction: 0.02, certificateMaxFraction: 0.034, flashPointC: 90, priceMinorPerKg: 7400, productNumber: 'AS 1302', receivedInWeek: 18, bestBeforeInWeek: 110, intendedUseNote: 'May accelerate.' },
  { code: 'CS-6001', scent: 'clove-stove', supplier: 'corvane', cold: { weeks: [10, 104], count: 0 }, hot: { weeks: [10, 104], count: 7, onlyPriya: true }, notInWeeks: [87, 90], vanillinFraction: 0, certificateMaxFraction: 0.011, flashPointC: 86, priceMinorPerKg: 5200, productNumber: 'C-3390', receivedInWeek: 8, bestBeforeInWeek: 112, intendedUseNote: 'High in eugenol. Test first.' },
  { code: 'GR-4120', scent: 'arbour-rose', supplier: 'aldersyke', ...alike(35, 45, 3, 0), vanillinFraction: 0, certificateMaxFraction: 0.045, flashPointC: 82, priceMinorPerKg: 9600, productNumber: 'AS 1519', receivedInWeek: 33, bestBeforeInWeek: 90 },
  { code: 'GR-4188', scent: 'arbour-rose', supplier: 'aldersyke', ...alike(70, 80, 3, 1), vanillinFraction: 0, flashPointC: 82, priceMinorPerKg: 9600, productNumber: 'AS 1519', receivedInWeek: 46, bestBeforeInWeek: 66 },
];

/** Cold batches without any scent. */
export const unscented = { count: 7, weeks: [1, 104] as [number, number] };

export const rebatchWeeks = [20, 41, 66, 90] as const;
