import { logistic, randomOf, within } from '../random.ts';
import { dayOfYear } from './calendar.ts';
import { gelLogit } from './chances.ts';
import { cookOf } from './cook.ts';
import { saltmarshFormulas, saltmarshMoulds } from './saltmarsh-stock.ts';
import type { BatchInputs, HistoryMaterial } from './types.ts';
import { weigh } from './weighing.ts';

export const saltmarshScents: HistoryMaterial[] = [
  { key: 'samphire', kind: 'fragrance', name: 'Samphire' },
  { key: 'tarred-rope', kind: 'fragrance', name: 'Tarred Rope' },
];

const stock: Readonly<Record<string, string>> = { olive: 'LH-31', coconut: 'LH-32', shea: 'LH-36', castor: 'LH-37', naoh: 'LH-40' };
/** Number of the first batch that took from the newer Samphire lot. */
const newerLotFrom = 6;

/** Inputs of the small workshop: one formula, one mould, two scents, always cold. */
export function saltmarshInputs(seed: number, n: number, code: string, madeOn: string): BatchInputs {
  const r = randomOf(seed, 'inputs', code);
  const [mould, version] = [saltmarshMoulds[0], saltmarshFormulas[0]?.versions[0]];
  if (!mould || !version) throw new RangeError('the small workshop has one mould and one formula');
  const round = (value: number, digits: number) => Number(value.toFixed(digits));
  const roomC = 18.5 + 3.5 * Math.sin((2 * Math.PI * (dayOfYear(madeOn) - 105)) / 365) + r.normal(0, 1);
  const oilC = r.normal(39, 2.5);
  const ratio = r.normal(2, 0.1);
  const covered = r.chance(0.7);
  const rope = n % 3 === 2;
  const lot = rope ? 'M-0105' : n < newerLotFrom ? 'M-0098' : 'M-0113';
  const load = within(r.normal(2.8, 0.3), 2, 3.6);
  const u = r.unit();
  const logit = gelLogit({ roomC, oilC, ratio, covered, mould: mould.key });
  const cutHours = within(r.normal(28, 4), 20, 44);
  const { ingredients, superfatWeighedFraction } = weigh(r, {
    lines: version.lines, oilMassG: mould.oilMassG, superfatFraction: version.superfatFraction + r.normal(0.2, 0.6) / 100, waterToLye: ratio, milkShareOfLiquid: 0, extras: [],
    fragrance: { material: rope ? 'tarred-rope' : 'samphire', lot, shareOfOils: load / 100 }, lotOf: (material) => stock[material] ?? null,
  });
  return {
    method: 'cold', maker: r.chance(0.6) ? 'maren' : 'jory', formula: 'shore', formulaVersion: 1, mould: mould.key, oilMassG: mould.oilMassG, bars: mould.bars,
    waterToLye: round(ratio, 2), superfatFraction: version.superfatFraction, superfatWeighedFraction,
    oilTemperatureC: round(oilC, 1), lyeTemperatureC: round(oilC + r.normal(0, 2), 1), batterTemperatureC: round(oilC - 0.5, 1), scentTemperatureC: null,
    roomTemperatureC: round(roomC, 1), humidityFraction: round(within(r.normal(0.6, 0.06), 0.4, 0.85), 2), blendSeconds: Math.round(within(r.normal(50, 10), 20, 90)),
    traceAtScent: null, traceAtPour: null, minutesToPour: null, cover: covered ? 'board-and-towel' : 'open', isSprayed: false,
    gel: u < logistic(logit) ? 'full' : u < logistic(logit + 1.1) ? 'partial' : 'none', ...cookOf(r, 'cold'),
    mouldHours: round(cutHours - 1.5, 1), cutHours: round(cutHours, 1), fragranceFraction: round(load / 100, 4), fragranceLot: lot, hasWhitePigment: false, hasEmbeds: false,
    ingredients, palette: rope ? { base: '#b9a48a', second: '#4a4038', third: '#d8c8b2', design: 'swirl' } : { base: '#cfd6c2', second: '#7f9a7c', third: '#e6e9da', design: n % 2 === 0 ? 'layers' : 'plain' },
  };
}
