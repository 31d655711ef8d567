import type { Random } from '../random.ts';
import { fats } from './materials.ts';
import type { FormulaLine, Ingredient } from './types.ts';

/** NaOH for each gram of KOH, the quotient of their molar masses. */
const naohPerKoh = 39.997 / 56.1056;
export const naohPurity = 0.985;

const kohPerGram = new Map(fats.map((fat) => [fat.key, (fat.saponificationKohMgPerG ?? 0) / 1000]));

/** Grams of pure KOH that the weighed fats would take; lines that are no fat take none. */
export function kohDemandG(lines: readonly { material: string; massG: number }[]): number {
  return lines.reduce((sum, line) => sum + line.massG * (kohPerGram.get(line.material) ?? 0), 0);
}

/** Grams of NaOH, as bought, that leave this share of the fats free. */
export function naohForG(kohG: number, superfatFraction: number): number {
  return (kohG * naohPerKoh * (1 - superfatFraction)) / naohPurity;
}

/** Share of the fats left free by what was really weighed; below zero there is alkali left over. */
export function superfatFraction(kohG: number, naohG: number): number {
  return 1 - (naohG * naohPurity) / naohPerKoh / kohG;
}

export interface Weighing {
  lines: readonly FormulaLine[];
  oilMassG: number;
  superfatFraction: number;
  waterToLye: number;
  milkShareOfLiquid: number;
  extras: readonly FormulaLine[];
  fragrance: { material: string; lot: string; shareOfOils: number } | null;
  lotOf: (material: string) => string | null;
}

const grams = (value: number) => Math.round(value * 10) / 10;

/** What went into the pot, as a careful scale shows it, and the superfat that follows. */
export function weigh(random: Random, what: Weighing): { ingredients: Ingredient[]; superfatWeighedFraction: number } {
  const line = (material: string, massG: number, lot = what.lotOf(material)): Ingredient =>
    ({ material, lot, massG, shareOfOils: massG / what.oilMassG });
  const dry = [...what.lines, ...what.extras].map((l) => line(l.material, grams(l.shareOfOils * what.oilMassG * (1 + random.normal(0, 0.0015)))));
  const isFat = (l: Ingredient) => kohPerGram.has(l.material);
  const koh = kohDemandG(dry);
  const naoh = grams(naohForG(koh, what.superfatFraction));
  const liquid = naoh * what.waterToLye;
  const wet = [line('water', grams(liquid * (1 - what.milkShareOfLiquid)))];
  if (what.milkShareOfLiquid > 0) wet.push(line('goat-milk', grams(liquid * what.milkShareOfLiquid)));
  const scent = what.fragrance ? [line(what.fragrance.material, grams(what.fragrance.shareOfOils * what.oilMassG), what.fragrance.lot)] : [];
  return {
    ingredients: [...dry.filter(isFat), line('naoh', naoh), ...wet, ...scent, ...dry.filter((l) => !isFat(l))],
    superfatWeighedFraction: superfatFraction(koh, naoh),
  };
}
