import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import type { Gel } from '#shared/words/batch-words.ts';

/** What the chances of a batch's faults follow from. Temperatures in °C, load and superfat in per cent of the oils. */
export interface FaultFacts {
  cold: boolean;
  fluid: boolean;
  oven: boolean;
  lot: string | null;
  vanillinPct: number;
  loadPct: number;
  ratio: number;
  oilC: number;
  roomC: number;
  humidityPct: number;
  blendSeconds: number;
  scentC: number | null;
  cutHours: number;
  /** As weighed, less the formula's target. */
  superfatOffPct: number;
  covered: boolean;
  sprayed: boolean;
  gel: Gel;
  mould: string;
  formula: string;
  white: boolean;
  embeds: boolean;
  oldSunflower: boolean;
  /** Faults of this batch settled before this one is asked. */
  has: ReadonlySet<CatalogueSlug>;
}

const is = (condition: boolean): number => (condition ? 1 : 0);

/** Chance so small that two years of batches never show it. */
const never = -20;

/**
 * Log-odds of each fault, the planted truth of the story. The order matters:
 * faults of the batter come before those they bring about.
 */
export const faultLogits: readonly (readonly [CatalogueSlug, (f: FaultFacts) => number])[] = [
  ['acceleration', (f) => (f.cold
    ? -3.2 + 4.4 * is(f.lot === 'EF-7802') + 1.3 * is(f.lot === 'LA-5560') + 0.1 * (f.oilC - 38) + 0.012 * (f.blendSeconds - 45) + 0.7 * is(f.loadPct > 3.5)
    : -6)],
  ['ricing', (f) => (f.cold ? -3.6 + 2.6 * is(f.lot === 'EF-7802') + 0.8 * is(f.lot === 'TF-2204') + 2.8 * is(f.lot === 'TF-2204' && f.oilC < 36) : -5.5)],
  ['seizing', (f) => (f.cold ? -4.8 + 2.7 * is(f.lot === 'EF-7802') : -6.5)],
  ['false-trace', (f) => (f.cold ? -4 + 2 * is(f.oilC < 33) : never)],
  ['separation', () => -4.4],
  ['soda-ash', (f) => (f.cold
    ? 0.15 + 4 * (f.ratio - 2) - 1.6 * is(f.gel === 'full') - 0.6 * is(f.gel === 'partial') - 0.8 * is(f.sprayed) - 0.7 * is(f.covered)
    : -3.6)],
  ['glycerin-rivers', (f) => (f.cold ? -3 + 1.7 * is(f.gel === 'full') + 1.4 * is(f.white) + 2.5 * (f.ratio - 2) : -4.2)],
  ['partial-gel-ring', (f) => (f.cold ? (f.gel === 'partial' ? 1 : -4.6) : -6)],
  ['air-pockets', (f) => (f.cold ? -2.7 + 1.6 * is(f.has.has('acceleration') || f.has.has('seizing')) : f.fluid ? -1.6 : -0.4)],
  ['vanilla-browning', (f) => -4.6 + 19 * ((f.vanillinPct * f.loadPct) / 100)],
  // Nothing fades where there was no scent.
  ['scent-fade', (f) => (f.lot === null ? never : -3 + 2.4 * is(f.lot.startsWith('LS-')) + (f.scentC === null ? 0 : 0.07 * (f.scentC - 70)))],
  ['overheating-crack', (f) => (f.cold
    ? -4.3 + 2.2 * is(f.formula === 'milk-and-oat') + 1.3 * is(f.oven) + 0.8 * is(f.covered) + 0.2 * (f.roomC - 19)
    : -6)],
  ['soft-sticky', (f) => -3.2 + 1.8 * is(f.formula === 'high-olive') + (f.cold ? 0.8 * is(f.ratio > 2.2) : 0)],
  ['crumbly', (f) => -4.2 + (f.cold ? 3.4 * is(f.formula === 'salt' && f.cutHours > 6) : 0)],
  ['stearic-spots', (f) => (f.cold ? -3.4 + 2.2 * is(f.oilC < 34 && (f.formula === 'kitchen' || f.formula === 'everyday')) : -6)],
  ['sweating', (f) => -3 + 0.12 * (f.humidityPct - 58) + 1.2 * is(f.formula === 'salt') + (f.cold ? 0 : 0.7)],
  ['orange-spots', (f) => -3.9 + 3.1 * is(f.oldSunflower) + 0.35 * (f.superfatOffPct - 0.5)],
  ['drag-marks', (f) => -1.9 + 0.03 * (f.cutHours - 24) + (f.cold ? 0 : 0.7)],
  ['heat-tunnels', (f) => (f.cold ? -4.2 + 1.6 * is(f.oven) + 0.8 * is(f.mould === 'M2') : -7)],
  ['stuck-in-mould', (f) => (f.cold ? -2.9 + is(f.mould === 'M2' && f.gel === 'none') : -2.4)],
  ['colour-shift', () => -3.3],
  ['colour-bleed', (f) => -3.3 + 1.2 * is(f.formula === 'charcoal')],
  ['colour-specks', () => -3.3],
  ['warping', () => -3.3],
  ['uneven-bars', () => -3.3],
  ['wrap-marks', (f) => -3.3 + 2 * is(f.has.has('sweating'))],
  ['off-smell', () => -4.2],
  ['embed-detachment', (f) => (f.embeds ? -2 : never)],
  ['foreign-matter', () => -5.8],
];

/** Log-odds that gel is full or partial in a cold loaf; `full` below the first, `partial` below the second. */
export function gelLogit(f: Pick<FaultFacts, 'roomC' | 'oilC' | 'ratio' | 'covered' | 'mould'>): number {
  return -0.9 + 0.3 * (f.roomC - 19) + 0.06 * (f.oilC - 38) + 0.8 * (f.ratio - 2) + is(f.covered) - is(f.mould === 'M4');
}
