import { type CatalogueSlug, catalogueFault } from '#server/features/faults/catalogue.ts';
import type { SeverityGrade } from '#server/features/faults/catalogue/fault-definition.ts';
import { appliesTo } from '#server/features/faults/checklist.ts';
import { familyOf } from '#shared/words/methods.ts';
import type { Stage } from '#shared/words/stages.ts';
import { logistic, type Random, randomOf } from '../random.ts';
import { type FaultFacts, faultLogits } from './chances.ts';
import { type Pin, pinned } from './pins.ts';
import { quernbyScentLots } from './quernby-scent-lots.ts';
import type { BatchInputs, TrueFault } from './types.ts';

type Grades = readonly (readonly [SeverityGrade, number])[];
const ordinaryGrades: Grades = [[1, 0.55], [2, 0.37], [3, 0.08]];
const roughGrades: Grades = [[1, 0.48], [2, 0.37], [3, 0.15]];
const gradesOf: Readonly<Partial<Record<CatalogueSlug, Grades>>> = {
  seizing: [[2, 0.6], [3, 0.4]], ricing: roughGrades, 'orange-spots': [[1, 0.35], [2, 0.4], [3, 0.25]], 'foreign-matter': [[2, 0.8], [3, 0.2]],
};
/** Share of further bars that carry a fault, by severity. */
const spreadOf = { 1: 0.25, 2: 0.55, 3: 0.85 } as const;

/** When a fault shows for the first time, where that is not always its first stage. */
const onset: Readonly<Partial<Record<CatalogueSlug, readonly (readonly [Stage, number])[]>>> = {
  'soda-ash': [['unmould', 0.5], ['cut', 0.25], ['cure-w1', 0.25]],
  'colour-shift': [['unmould', 0.2], ['cut', 0.5], ['cure-w2', 0.3]],
  'vanilla-browning': [['cut', 0.3], ['cure-w1', 0.5], ['cure-w2', 0.2]],
  'colour-bleed': [['cut', 0.3], ['cure-w2', 0.5], ['cure-w4', 0.2]],
  'partial-gel-ring': [['unmould', 0.3], ['cut', 0.7]],
  'overheating-crack': [['pour', 0.3], ['unmould', 0.7]],
  'heat-tunnels': [['unmould', 0.5], ['cut', 0.5]],
  'soft-sticky': [['unmould', 0.8], ['cut', 0.2]],
  sweating: [['cure-w1', 0.5], ['cure-w2', 0.3], ['cure-w4', 0.2]],
  warping: [['cure-w1', 0.4], ['cure-w2', 0.4], ['cure-w4', 0.2]],
  'orange-spots': [['cure-w4', 0.3], ['cure-w6', 0.4], ['release', 0.3]],
  'scent-fade': [['cure-w2', 0.2], ['cure-w4', 0.5], ['cure-w6', 0.3]],
  'off-smell': [['cut', 0.5], ['cure-w1', 0.3], ['cure-w4', 0.2]],
  'foreign-matter': [['cut', 1]],
};
const growing = new Set<CatalogueSlug>(['soda-ash', 'vanilla-browning', 'colour-bleed', 'orange-spots', 'scent-fade', 'warping']);

/** The faults a batch really has: pinned ones as the story says, the others drawn. */
export function drawTruth(seed: number, code: string, inputs: BatchInputs, pin: Pin | undefined): TrueFault[] {
  const has = new Set<CatalogueSlug>();
  const facts = factsOf(inputs, has);
  const faults: TrueFault[] = [];
  for (const [fault, logit] of faultLogits) {
    const r = randomOf(seed, 'fault', code, fault);
    const drawn = r.chance(logistic(logit(facts)));
    const grade = r.weighted(fault === 'air-pockets' && !facts.cold ? roughGrades : (gradesOf[fault] ?? ordinaryGrades));
    const settled = pinned(pin, fault);
    const severity = settled === undefined ? (drawn && appliesTo(fault, inputs.method) ? grade : 'absent') : settled;
    if (severity === 'absent') continue;
    has.add(fault);
    faults.push(unfold(r, fault, severity, inputs.bars));
  }
  const heavy = pinned(pin, 'lye-heavy');
  if (heavy !== undefined && heavy !== 'absent') {
    faults.push({ fault: 'lye-heavy', severity: heavy, from: 'cut', grows: true, bars: Array.from({ length: inputs.bars }, (_, n) => n + 1) });
  }
  return faults;
}

function unfold(r: Random, fault: CatalogueSlug, severity: SeverityGrade, bars: number): TrueFault {
  const from = r.weighted<Stage>(onset[fault] ?? [[catalogueFault(fault).firstSeen, 1]]);
  const affected = 1 + r.binomial(bars - 1, spreadOf[severity]);
  // Most faults sit together: at one end of the loaf, or in a run of bars.
  const first = r.chance(0.5) ? 1 : r.whole(1, bars - affected + 1);
  const until = lasts(fault, severity);
  return {
    fault, severity, from, ...(until ? { until } : {}), grows: growing.has(fault),
    bars: Array.from({ length: affected }, (_, n) => first + n),
  };
}

/** Faults that pass: mild softness goes with the cure, a mild crack is planed away. */
function lasts(fault: CatalogueSlug, severity: SeverityGrade): Stage | undefined {
  if (fault === 'soft-sticky') return severity === 1 ? 'cut' : severity === 2 ? 'cure-w1' : 'cure-w4';
  if (fault === 'overheating-crack') return severity === 1 ? 'unmould' : undefined;
  if (fault === 'off-smell' && severity === 1) return 'cure-w2';
  if (fault === 'foreign-matter') return 'cut';
  return fault === 'separation' && severity === 1 ? 'unmould' : undefined;
}

function factsOf(inputs: BatchInputs, has: ReadonlySet<CatalogueSlug>): FaultFacts {
  const lot = quernbyScentLots.find((l) => l.code === inputs.fragranceLot);
  return {
    cold: familyOf(inputs.method) === 'cold', fluid: inputs.method === 'hot-fluid', oven: inputs.method === 'cold-oven',
    lot: inputs.fragranceLot, vanillinPct: (lot?.vanillinFraction ?? 0) * 100, loadPct: (inputs.fragranceFraction ?? 0) * 100,
    ratio: inputs.waterToLye, oilC: inputs.oilTemperatureC, roomC: inputs.roomTemperatureC, humidityPct: inputs.humidityFraction * 100,
    blendSeconds: inputs.blendSeconds, scentC: inputs.scentTemperatureC, cutHours: inputs.cutHours,
    superfatOffPct: (inputs.superfatWeighedFraction - inputs.superfatFraction) * 100,
    covered: inputs.cover !== 'open', sprayed: inputs.isSprayed, gel: inputs.gel, mould: inputs.mould, formula: inputs.formula,
    white: inputs.hasWhitePigment, embeds: inputs.hasEmbeds, oldSunflower: inputs.ingredients.some((line) => line.lot === 'SU-884'), has,
  };
}
