import type { Cover, Gel } from '#shared/words/batch-words.ts';
import type { Method } from '#shared/words/methods.ts';
import { logistic, type Random, randomOf, within } from '../random.ts';
import { dayOfYear } from './calendar.ts';
import { gelLogit } from './chances.ts';
import { cookOf } from './cook.ts';
import { fats } from './materials.ts';
import { paletteOf } from './palettes.ts';
import type { Pin } from './pins.ts';
import { quernbyFormulas, versionInWeek } from './quernby-formulas.ts';
import { quernbyMoulds } from './quernby-people.ts';
import { quernbyScentLots } from './quernby-scent-lots.ts';
import type { Slot } from './schedule.ts';
import { lotInWeek } from './stock-lots.ts';
import type { BatchInputs, FormulaLine } from './types.ts';
import { weigh } from './weighing.ts';

const makers = {
  cold: [['ilse', 0.45], ['tomasz', 0.48], ['priya', 0.07]],
  hot: [['ilse', 0.14], ['tomasz', 0.1], ['priya', 0.76]],
} as const;
const formulas = {
  cold: [['everyday', 0.3], ['kitchen', 0.15], ['milk-and-oat', 0.12], ['salt', 0.08], ['high-olive', 0.13], ['charcoal', 0.17], ['hotel', 0.05]],
  hot: [['everyday', 0.3], ['kitchen', 0.14], ['milk-and-oat', 0.1], ['high-olive', 0.1], ['charcoal', 0.1], ['hotel', 0.26]],
} as const;
const habits = { ilse: { ratio: 2.05, oilC: 40, covered: 0.5, blend: 45 }, tomasz: { ratio: 2.3, oilC: 36, covered: 0.3, blend: 60 }, priya: { ratio: 2.1, oilC: 42, covered: 0.6, blend: 50 } };
/** Scents that get a colour, in formulas that take one. */
const colours: Readonly<Record<string, string>> = { 'ember-fig': 'red-clay', tideflat: 'ultramarine', 'lime-shrub': 'green-oxide', 'arbour-rose': 'red-clay' };

/** Weeks from which the workshop worked otherwise: less water and every loaf covered; scent below 70 °C into hot batches. */
const lessWaterFrom = 53;
const coolerScentFrom = 70;

/** Everything that is settled about a batch before a fault can show. */
export function drawInputs(seed: number, slot: Slot, code: string, pin: Pin | undefined): BatchInputs {
  const r = randomOf(seed, 'inputs', code);
  const cold = slot.family === 'cold';
  const side = cold ? 'cold' : 'hot';
  const maker = slot.maker ?? r.weighted<keyof typeof habits>(makers[side]);
  const habit = habits[maker as keyof typeof habits];
  const formula = pin?.formula ?? (slot.family === 'rebatch' ? 'everyday' : r.weighted<string>(formulas[side]));
  const method = methodOf(r, slot, maker);
  const roomC = 19 + 4.5 * Math.sin((2 * Math.PI * (dayOfYear(slot.madeOn) - 105)) / 365) + r.normal(0, 1.2);
  const humidity = within(56 + 9 * Math.sin((2 * Math.PI * (dayOfYear(slot.madeOn) - 150)) / 365) + r.normal(0, 6), 30, 92);
  const late = slot.week >= lessWaterFrom;
  const ratio = cold
    ? late ? r.normal(maker === 'tomasz' ? 1.87 : 1.8, 0.09) : r.normal(habit.ratio, 0.14)
    : r.normal(method === 'hot-fluid' ? 2.9 : 2.5, 0.12);
  const oilC = cold ? r.normal(habit.oilC, 3.2) : r.normal(72, 4);
  const coolLye = r.chance(0.3) && cold && maker === 'tomasz';
  const lyeC = coolLye ? 24 + r.normal(0, 0.8) : oilC + r.normal(0, 3);
  const covered = r.chance(late ? 0.92 : habit.covered);
  const sprayed = r.chance(0.4) && method === 'cold';
  const mould = mouldOf(r, slot.week);
  const place = quernbyMoulds.find((m) => m.key === (pin?.mould ?? mould)) ?? quernbyMoulds[0];
  if (!place) throw new RangeError('no mould');
  const scent = quernbyScentLots.find((lot) => lot.code === slot.lot);
  const load = scent ? (scent.code === 'CS-6001' ? within(r.normal(1.2, 0.15), 0.8, 1.6) : within(r.normal(3, 0.5), 1.5, 4.5)) : null;
  const blend = within(r.normal(habit.blend, 14), 10, 150) * (cold ? 1 : 2);
  const cutHours = within(formula === 'salt' ? r.normal(6, 2) : r.normal(cold ? 26 : 20, 7), 4, 72);
  const scentC = cold || !scent ? null : r.normal(method === 'hot-fluid' ? 76 : slot.week < coolerScentFrom ? 84 : 67, 4);
  const recipe = quernbyFormulas.find((f) => f.key === formula);
  const number = pin?.formulaVersion ?? versionInWeek(formula, slot.week);
  const version = recipe?.versions.find((v) => v.number === number);
  if (!version) throw new RangeError(`no version ${number} of ${formula}`);
  const gel = gelOf(r, method, gelLogit({ roomC, oilC, ratio, covered, mould: place.key }));
  const white = r.chance(0.45) && (formula === 'everyday' || formula === 'milk-and-oat');
  const colour = scent && ['everyday', 'milk-and-oat', 'high-olive'].includes(formula) && r.chance(0.8) ? colours[scent.scent] : undefined;
  const oldSunflower = r.chance(0.6) && slot.week >= 60 && slot.week <= 78 && version.lines.some((l) => l.material === 'sunflower');
  const extras: FormulaLine[] = [];
  if (white) extras.push({ material: 'titanium-dioxide', shareOfOils: 0.003 });
  if (colour) extras.push({ material: colour, shareOfOils: r.between(0.003, 0.008) });
  if (method === 'hot-fluid') extras.push({ material: 'sodium-lactate', shareOfOils: 0.025 });
  const lots: Record<string, string> = { ...(oldSunflower ? { sunflower: 'SU-884' } : {}), ...pin?.lots };
  const { ingredients, superfatWeighedFraction } = weigh(r, {
    lines: version.lines.filter((l) => l.material !== 'salt' || cold), oilMassG: place.oilMassG,
    superfatFraction: Math.max(0.004, version.superfatFraction + r.normal(0.5, 0.9) / 100), waterToLye: ratio,
    milkShareOfLiquid: formula === 'milk-and-oat' ? 0.5 : 0, extras,
    fragrance: scent && load !== null ? { material: scent.scent, lot: scent.code, shareOfOils: load / 100 } : null,
    lotOf: (material) => lots[material] ?? lotInWeek(material, slot.week),
  });
  return {
    method, maker, formula, formulaVersion: number, mould: place.key, oilMassG: place.oilMassG, bars: place.bars,
    waterToLye: round(ratio, 2), superfatFraction: version.superfatFraction, superfatWeighedFraction,
    oilTemperatureC: round(oilC, 1), lyeTemperatureC: round(lyeC, 1),
    batterTemperatureC: round(cold ? (oilC + lyeC) / 2 + r.normal(0.5, 0.8) : within((scentC ?? 76) + r.normal(1, 1.5), 60, 92), 1),
    scentTemperatureC: scentC === null ? null : round(scentC, 1), roomTemperatureC: round(roomC, 1), humidityFraction: round(humidity / 100, 2),
    blendSeconds: Math.round(blend), traceAtScent: null, traceAtPour: null, minutesToPour: null,
    cover: coverOf(r, covered), isSprayed: sprayed, gel, ...cookOf(r, method),
    mouldHours: round(Math.max(2.5, cutHours - r.between(0.5, Math.min(3, cutHours / 3))), 1), cutHours: round(cutHours, 1),
    fragranceFraction: load === null ? null : round(load / 100, 4), fragranceLot: slot.lot, hasWhitePigment: white, hasEmbeds: false,
    ingredients, palette: paletteOf(randomOf(seed, 'palette', code), scent?.scent ?? null, formula),
  };
}

/** Formulas whose sunflower is the regular kind are looked at in week 6 even when made hot. */
export function isLinoleicRich(inputs: Pick<BatchInputs, 'ingredients'>): boolean {
  const rich = new Set(fats.filter((fat) => fat.isLinoleicRich).map((fat) => fat.key));
  return inputs.ingredients.some((line) => rich.has(line.material) && line.shareOfOils >= 0.08);
}

function methodOf(r: Random, slot: Slot, maker: string): Method {
  const second = r.unit();
  if (slot.family === 'rebatch') return 'rebatch';
  if (slot.family === 'hot') return second < 0.3 ? 'hot-fluid' : 'hot';
  return second < (maker === 'tomasz' ? 0.24 : 0.15) ? 'cold-oven' : 'cold';
}

function mouldOf(r: Random, week: number): string {
  const silicone = week < 41 ? 0 : week < 53 ? 0.45 : 0.7;
  const isSilicone = r.chance(silicone);
  const other = r.weighted([['M1', 0.55], ['M3', 0.25], ['M4', 0.2]] as const);
  return isSilicone ? 'M2' : other;
}

function gelOf(r: Random, method: Method, logit: number): Gel {
  const u = r.unit();
  if (method === 'cold-oven') return u < 0.96 ? 'full' : 'partial';
  if (method !== 'cold') return 'full';
  return u < logistic(logit) ? 'full' : u < logistic(logit + 1.1) ? 'partial' : 'none';
}

function coverOf(r: Random, covered: boolean): Cover {
  const towel = r.chance(0.6);
  return covered ? (towel ? 'board-and-towel' : 'board') : 'open';
}

function round(value: number, digits: number): number {
  return Number(value.toFixed(digits));
}
