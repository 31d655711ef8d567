import { CURE_LOSS, fragranceInBar } from './fragrance-allowance.ts';
import type { FieldProblem } from './http/problem.ts';
import type { NewBatch } from './batches.ts';
import type { LotView } from './lots.ts';
import type { MaterialKind } from './words/lot-words.ts';
import { familyOf, type MethodFamily } from './words/methods.ts';

type Line = NewBatch['ingredients'][number] & { kind: MaterialKind; isEssentialOil?: boolean };
export type WarnedBatch = Omit<NewBatch, 'id' | 'code' | 'state' | 'ingredients'> & { ingredients: readonly Line[] };
export type WarnedLot = Pick<LotView, 'id' | 'code' | 'materialName' | 'materialKind' | 'standing' | 'bestBeforeOn' | 'certificateMaxFraction' | 'flashPointC'>;

/** How temperatures and masses are said; SI unless the person likes it otherwise. */
export interface Sayings {
  temperature(celsius: number): string;
  mass(grams: number): string;
}
const SI: Sayings = { temperature: (celsius) => `${celsius} °C`, mass: (grams) => `${Number(grams.toFixed(grams < 20 ? 2 : 1))} g` };

interface SoftLimit {
  lower?: number;
  upper?: number;
  say: (value: (given: number) => string) => string;
}
type Measure = 'oilMassG' | 'superfatFraction' | 'oilTemperatureC' | 'lyeTemperatureC' | 'blendSeconds' | 'minutesToPour' | 'scentTemperatureC' | 'roomTemperatureC'
  | 'humidityFraction' | 'mouldHours' | 'cutHours' | 'cookTemperatureC' | 'cookMinutes' | 'cookLossFraction';

const both: Partial<Record<Measure, SoftLimit>> = {
  oilMassG: { lower: 200, upper: 30_000, say: (value) => `Oils are mostly between ${value(200)} and ${value(30_000)}` },
  superfatFraction: { lower: 0.02, upper: 0.1, say: () => 'Superfat is mostly 2 to 10 %; salt bars take 15 to 20 %' },
  roomTemperatureC: { lower: 15, upper: 28, say: (value) => `A room between ${value(15)} and ${value(28)} is calmer for a pour` },
  humidityFraction: { upper: 0.65, say: () => 'Above 65 % humidity bars dry slowly and may sweat' },
};
const SOFT: Record<MethodFamily, Partial<Record<Measure, SoftLimit>>> = {
  cold: {
    ...both,
    oilTemperatureC: { lower: 27, upper: 55, say: (value) => `Oils for a cold batch are mostly between ${value(27)} and ${value(55)}` },
    lyeTemperatureC: { upper: 60, say: (value) => `Lye for a cold batch is mostly at most ${value(60)}` },
    blendSeconds: { upper: 150, say: () => 'More than 150 s of blending thickens most cold batches' },
    minutesToPour: { upper: 20, say: () => 'More than 20 min from trace to pour: the batter may have set' },
    mouldHours: { lower: 12, say: () => 'Less than 12 h in the mould: only salt bars come out clean' },
    cutHours: { lower: 18, upper: 72, say: () => 'A cold loaf is mostly cut 18 to 72 h after the pour; salt bars after 3 to 8 h' },
  },
  hot: {
    ...both,
    scentTemperatureC: { upper: 80, say: (value) => `Above ${value(80)} much of the scent is lost` },
    cutHours: { lower: 12, upper: 36, say: () => 'A hot loaf is mostly cut 12 to 36 h after it was packed' },
    cookTemperatureC: { upper: 98, say: (value) => `A cook above ${value(98)} boils` },
    cookMinutes: { upper: 240, say: () => 'A cook of more than 240 min dries out' },
    cookLossFraction: { upper: 0.12, say: () => 'More than 12 % lost in the cook makes a dry, crumbly mass' },
  },
  rebatch: { roomTemperatureC: both.roomTemperatureC as SoftLimit, humidityFraction: both.humidityFraction as SoftLimit },
};
/** Lye concentration that usually works, as fractions. */
const CONCENTRATION = { cold: [0.27, 0.38], hot: [0.22, 0.35] } as const;
const MOST_DIFFERENCE_C = 15;
const MOST_FRAGRANCE = 0.05;
const MOST_ESSENTIAL_OIL = 0.03;

/**
 * What is unusual about a batch and may yet be right: soft limits by the method's family, lots that should
 * not go in, fragrance against its certificate. Empty when nothing is. Hard limits are the schema's.
 *
 * @param batch as typed so far, SI inside; unknown values null
 * @param lots the lots its ingredients name; others are left unsaid
 *
 * Source: common practice of small workshops; certificate maxima as in `fragranceInBar`.
 */
export function batchWarnings(batch: WarnedBatch, lots: readonly WarnedLot[], say: Sayings = SI): FieldProblem[] {
  const family = familyOf(batch.method);
  return [...ofMeasures(batch, family, say), ...ofLye(batch, family), ...ofTemperatures(batch, family, say), ...ofShares(batch), ...ofLots(batch, lots, family), ...ofScents(batch, lots, family, say)];
}

const warn = (pointer: string, detail: string): FieldProblem => ({ pointer, detail });
const percent = (fraction: number, decimals = 1) => `${(fraction * 100).toFixed(decimals)} %`;

function ofMeasures(batch: WarnedBatch, family: MethodFamily, say: Sayings): FieldProblem[] {
  return (Object.entries(SOFT[family]) as [Measure, SoftLimit][]).flatMap(([field, { lower = -Infinity, upper = Infinity, say: words }]) => {
    const value = batch[field];
    if (value === null || (value >= lower && value <= upper)) return [];
    return [warn(`#/${field}`, words(field === 'oilMassG' ? say.mass : say.temperature))];
  });
}

function ofLye({ waterToLye }: WarnedBatch, family: MethodFamily): FieldProblem[] {
  if (waterToLye === null || family === 'rebatch') return [];
  const [weak, strong] = CONCENTRATION[family];
  const concentration = 1 / (1 + waterToLye);
  if (concentration >= weak && concentration <= strong) return [];
  return [warn('#/waterToLye', `Lye of ${percent(concentration)} is ${concentration < weak ? 'weak' : 'strong'} for a ${family} batch; mostly ${weak * 100} to ${strong * 100} %`)];
}

function ofTemperatures(batch: WarnedBatch, family: MethodFamily, say: Sayings): FieldProblem[] {
  const { oilTemperatureC: oils, lyeTemperatureC: lye } = batch;
  const warnings: FieldProblem[] = [];
  if (family === 'cold' && oils !== null && lye !== null && Math.abs(oils - lye) > MOST_DIFFERENCE_C) {
    warnings.push(warn('#/lyeTemperatureC', `Oils at ${say.temperature(oils)} and lye at ${say.temperature(lye)} stand far apart; within 15 degrees Celsius they mix more evenly`));
  }
  if (batch.isSprayed === true && (batch.cover === 'oven' || batch.method === 'cold-oven')) {
    warnings.push(warn('#/isSprayed', 'Alcohol vapour lights easily. No flame, oven, heat gun or sparks until it is dry.'));
  }
  return warnings;
}

function ofShares({ ingredients }: WarnedBatch): FieldProblem[] {
  const shares = (wanted: (line: Line) => boolean) => ingredients.filter(wanted).map((line) => line.shareOfOilsFraction);
  const warnings: FieldProblem[] = [];
  const fats = shares((line) => line.kind === 'fat');
  const sum = fats.reduce<number>((total, share) => total + (share ?? 0), 0);
  if (fats.length > 0 && fats.every((share) => share !== null) && Math.abs(sum - 1) > 0.005 + 1e-9) {
    warnings.push(warn('#/ingredients', `The fats’ shares add up to ${percent(sum)}; they should make 100 %`));
  }
  const last = (wanted: (line: Line) => boolean) => ingredients.findLastIndex(wanted);
  const isScent = (line: Line) => line.kind === 'fragrance';
  const isOil = (line: Line) => isScent(line) && line.isEssentialOil === true;
  const load = (wanted: (line: Line) => boolean) => shares(wanted).reduce<number>((total, share) => total + (share ?? 0), 0);
  if (load(isScent) > MOST_FRAGRANCE + 1e-9) warnings.push(warn(`#/ingredients/${last(isScent)}/shareOfOilsFraction`, `Fragrances make ${percent(load(isScent))} of the oils; mostly at most 5 %`));
  else if (load(isOil) > MOST_ESSENTIAL_OIL + 1e-9) warnings.push(warn(`#/ingredients/${last(isOil)}/shareOfOilsFraction`, `Essential oils make ${percent(load(isOil))} of the oils; mostly at most 3 %`));
  return warnings;
}

function ofLots({ ingredients, madeOn }: WarnedBatch, lots: readonly WarnedLot[], family: MethodFamily): FieldProblem[] {
  return ingredients.flatMap(({ lotId }, index) => {
    const lot = lots.find(({ id }) => id === lotId);
    if (!lot) return [];
    const at = (detail: string) => warn(`#/ingredients/${index}/lotId`, detail);
    const said: FieldProblem[] = [];
    if (lot.standing === 'on-hold') said.push(at(`${lot.code} is on hold; take another lot, or ask an owner to give it back`));
    else if (lot.standing === 'returned' || lot.standing === 'used-up') said.push(at(`${lot.code} is ${lot.standing === 'returned' ? 'returned' : 'used up'}; is it the right lot?`));
    else if (lot.standing === 'hot-process-only' && family === 'cold') said.push(at(`${lot.code} is for hot process only`));
    if (lot.bestBeforeOn && lot.bestBeforeOn < madeOn) said.push(at(`${lot.code} was best before ${lot.bestBeforeOn}`));
    if (lot.materialKind === 'fragrance' && lot.certificateMaxFraction === null) said.push(at('No certificate on file for this lot: the allowed amount is not known.'));
    if (lot.materialKind === 'fragrance' && lot.certificateMaxFraction === 0) said.push(at(`The certificate of ${lot.code} allows none in rinse-off soap`));
    return said;
  });
}

function ofScents(batch: WarnedBatch, lots: readonly WarnedLot[], family: MethodFamily, say: Sayings): FieldProblem[] {
  const scents = batch.ingredients.flatMap((line, index) => {
    const lot = lots.find(({ id }) => id === line.lotId);
    return line.kind === 'fragrance' && lot ? [{ line, index, lot, massG: massOf(line, batch.oilMassG) }] : [];
  });
  const warnings: FieldProblem[] = [];
  // A cold batch takes its scent at the batter's temperature.
  const scentC = batch.scentTemperatureC ?? (family === 'cold' ? batch.batterTemperatureC : null);
  const flash = scents.flatMap(({ lot }) => lot.flashPointC ?? []);
  if (scentC !== null && flash.length > 0 && scentC > Math.min(...flash)) {
    const field = batch.scentTemperatureC === null ? 'batterTemperatureC' : 'scentTemperatureC';
    warnings.push(warn(`#/${field}`, `Above this scent’s flash point (${say.temperature(Math.min(...flash))}): no flame, good air. Cooler keeps more scent.`));
  }
  const limited = scents.flatMap(({ lot, line, index, massG }) => (lot.certificateMaxFraction ? [{ index, line, massG, maximum: lot.certificateMaxFraction }] : []));
  const last = limited.at(-1);
  if (!last) return warnings;
  const lastField = last.line.shareOfOilsFraction === null ? 'massG' : 'shareOfOilsFraction';
  const pointer = `#/ingredients/${last.index}/${lastField}`;
  const restG = massWithoutFragrance(batch);
  const weighed = limited.flatMap(({ massG, maximum }) => (massG ? [{ massG, maximum }] : []));
  if (restG !== null && weighed.length === limited.length) {
    const keeps = (1 - CURE_LOSS[family]) * (1 - (family === 'hot' ? (batch.cookLossFraction ?? 0) : 0));
    const { fraction, used, largestG } = fragranceInBar(weighed, restG, keeps);
    if (used > 1) {
      warnings.push(warn(pointer, `Over the supplier’s maximum for rinse-off soap on the finished bar (${percent(fraction, 2)}, allowed ${percent(fraction / used, 2)}). At most ${say.mass(largestG)} in all.`));
    }
    return warnings;
  }
  // The finished bar weighs more than its oils, so a load within the maximum is allowed whatever else goes in.
  const parts = limited.reduce((sum, { line, maximum }) => sum + (line.shareOfOilsFraction ?? 0) / maximum, 0);
  if (parts > 1) warnings.push(warn(pointer, 'May be over the supplier’s maximum on the finished bar; weigh in oils, lye and water to know'));
  return warnings;
}

function massOf(line: Line, oilMassG: number | null): number | null {
  return line.massG ?? (line.shareOfOilsFraction !== null && oilMassG !== null ? line.shareOfOilsFraction * oilMassG : null);
}

/** Grams of everything but fragrance; null while fats, alkali or water are not known. */
function massWithoutFragrance(batch: WarnedBatch): number | null {
  const sum = (kind: MaterialKind) => batch.ingredients.filter((line) => line.kind === kind).reduce((total, line) => total + (massOf(line, batch.oilMassG) ?? 0), 0);
  const fatsG = batch.oilMassG ?? sum('fat');
  const alkaliG = sum('alkali');
  const waterG = sum('liquid') || (batch.waterToLye === null ? 0 : alkaliG * batch.waterToLye);
  if (fatsG === 0 || alkaliG === 0 || waterG === 0) return null;
  return fatsG + alkaliG + waterG + sum('colourant') + sum('additive');
}
