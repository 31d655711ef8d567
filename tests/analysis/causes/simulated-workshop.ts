import type { BatchRow, FaultSpec, InputSpec, Outcome } from '#analysis/causes/board-rows.ts';
import type { Random } from '#analysis/maths/random.ts';
import { normalDraw, randomFrom, shuffled } from '#analysis/maths/random.ts';

/**
 * An invented workshop with known truth: three makers with habits, ten fragrance
 * lots of which one is bad in cold batches (and mostly in the hands of one maker),
 * water that brings ash, hot batches that bring air pockets, a lot that is mostly
 * poured, and only cold, by the maker with much water (innocent), and answers missing at random.
 */
export const inputs: readonly InputSpec[] = [
  { slug: 'methodFamily', kind: 'nominal', class: 'other', knownAt: 'plan' },
  { slug: 'method', kind: 'nominal', class: 'other', knownAt: 'plan' },
  { slug: 'maker', kind: 'nominal', class: 'other', knownAt: 'plan' },
  { slug: 'formula', kind: 'nominal', class: 'other', knownAt: 'plan' },
  { slug: 'season', kind: 'nominal', class: 'other', knownAt: 'plan' },
  { slug: 'mould', kind: 'nominal', class: 'other', knownAt: 'pour' },
  { slug: 'cover', kind: 'nominal', class: 'other', knownAt: 'mould' },
  { slug: 'gel', kind: 'nominal', class: 'other', knownAt: 'mould' },
  { slug: 'colourant', kind: 'held', class: 'other', knownAt: 'plan' },
  { slug: 'fragranceLot', kind: 'held', class: 'lot', knownAt: 'scent-in' },
  { slug: 'fatLot', kind: 'held', class: 'lot', knownAt: 'weigh' },
  { slug: 'waterToLye', kind: 'number', class: 'other', knownAt: 'weigh' },
  { slug: 'superfatPct', kind: 'number', class: 'other', knownAt: 'weigh' },
  { slug: 'fragrancePct', kind: 'number', class: 'other', knownAt: 'scent-in' },
  { slug: 'oilTemperatureC', kind: 'number', class: 'other', knownAt: 'blend' },
  { slug: 'lyeTemperatureC', kind: 'number', class: 'other', knownAt: 'blend' },
  { slug: 'roomTemperatureC', kind: 'number', class: 'other', knownAt: 'pour' },
  { slug: 'humidityPct', kind: 'number', class: 'other', knownAt: 'pour' },
  { slug: 'blendSeconds', kind: 'number', class: 'other', knownAt: 'blend' },
  { slug: 'cutHours', kind: 'number', class: 'other', knownAt: 'cut' },
];

const suspects = (...slugs: string[]) => slugs.map((input) => ({ input }));

export const namedFaults: readonly FaultSpec[] = [
  { slug: 'acceleration', firstSeen: 'pour', suspects: suspects('fragranceLot', 'oilTemperatureC', 'blendSeconds') },
  { slug: 'ricing', firstSeen: 'pour', suspects: suspects('fragranceLot', 'oilTemperatureC') },
  { slug: 'soda-ash', firstSeen: 'unmould', suspects: suspects('waterToLye', 'gel', 'cover', 'roomTemperatureC') },
  { slug: 'glycerin-rivers', firstSeen: 'cut', suspects: suspects('gel', 'waterToLye', 'colourant') },
  { slug: 'air-pockets', firstSeen: 'cut', suspects: suspects('method', 'trace') },
  { slug: 'drag-marks', firstSeen: 'cut', suspects: suspects('cutHours') },
  { slug: 'orange-spots', firstSeen: 'cure-w4', suspects: suspects('fatLot', 'superfatPct') },
  { slug: 'sweating', firstSeen: 'cure-w1', suspects: suspects('humidityPct') },
];

/** As many faults as a full catalogue has; the unnamed ones have no cause but a family effect. */
export function faultsUpTo(count: number): FaultSpec[] {
  const more = Array.from({ length: Math.max(0, count - namedFaults.length) }, (_, i) => ({ slug: `plain-${String(i).padStart(2, '0')}`, firstSeen: 'cut', suspects: [] }));
  return [...namedFaults, ...more].slice(0, count);
}

const logistic = (x: number) => 1 / (1 + Math.exp(-x));

function pick<T>(random: Random, values: readonly (readonly [T, number])[]): T {
  let left = random.next() * values.reduce((sum, [, weight]) => sum + weight, 0);
  for (const [value, weight] of values) if ((left -= weight) < 0) return value;
  return values[values.length - 1]![0];
}

export const BAD_LOT = 'lot-bad';
export const INNOCENT_LOT = 'lot-innocent';
export const BAD_FAT = 'fat-old';

export interface WorkshopSettings {
  seed: number;
  batches: number;
  faults?: readonly FaultSpec[];
  /** Deal every fault's answers to the batches anew, so that nothing goes with anything. */
  permuted?: boolean;
}

interface Made { row: BatchRow; chances: Record<string, number>; skips: number }

function makeBatch(random: Random, index: number, batches: number): Made {
  const hot = random.next() < 0.3;
  const drawnMaker = hot ? pick(random, [['priya', 0.76], ['ilse', 0.14], ['tomasz', 0.1]]) : pick(random, [['ilse', 0.45], ['tomasz', 0.48], ['priya', 0.07]]);
  const lot = pick(random, [[BAD_LOT, 0.09], [INNOCENT_LOT, hot ? 0 : 0.16], ...Array.from({ length: 8 }, (_, i) => [`lot-${i}`, 0.1] as const)]);
  const maker = !hot && (lot === BAD_LOT || lot === INNOCENT_LOT) && random.next() < (lot === BAD_LOT ? 0.6 : 0.8) ? 'tomasz' : drawnMaker;
  const method = hot ? (random.next() < 0.3 ? 'hot-fluid' : 'hot') : random.next() < (maker === 'tomasz' ? 0.24 : 0.15) ? 'cold-oven' : 'cold';
  const formula = pick(random, [['everyday', 0.3], ['kitchen', 0.15], ['milk', 0.12], ['olive', 0.15], ['charcoal', 0.18], ['hotel', 0.1]]);
  const day = (index / batches) * 730;
  const room = 19 + 4.5 * Math.sin((2 * Math.PI * (day - 105)) / 365) + 1.2 * normalDraw(random);
  const humidity = 56 + 9 * Math.sin((2 * Math.PI * (day - 150)) / 365) + 6 * normalDraw(random);
  const ratio = hot ? 2.5 + 0.12 * normalDraw(random) : (maker === 'tomasz' ? 2.3 : 2.05) + 0.14 * normalDraw(random) - (day > 365 ? 0.2 : 0);
  const oil = hot ? 72 + 4 * normalDraw(random) : (maker === 'tomasz' ? 36 : 40) + 3.2 * normalDraw(random);
  const covered = random.next() < (day > 365 ? 0.8 : 0.4);
  const full = hot || method === 'cold-oven' || random.next() < logistic(-0.9 + 0.3 * (room - 19) + 0.8 * (ratio - 2) + (covered ? 1 : 0));
  const blend = Math.max(10, 45 + (maker === 'tomasz' ? 15 : 0) + 14 * normalDraw(random));
  const cut = Math.max(4, (hot ? 20 : 26) + 7 * normalDraw(random));
  const white = random.next() < 0.35;
  const fat = day > 420 && day < 550 && random.next() < 0.5 ? BAD_FAT : day > 365 ? 'fat-b' : 'fat-a';
  const bad = lot === BAD_LOT && !hot;
  const superfat = 5 + 0.9 * normalDraw(random);
  const row: BatchRow = {
    id: `b${String(index).padStart(6, '0')}`, method, family: hot ? 'hot' : 'cold',
    nominal: { maker, formula, season: ['winter', 'spring', 'summer', 'autumn'][Math.floor((day % 365) / 91.3)] ?? 'autumn', mould: pick(random, [['wood', 0.5], ['tall', 0.3], ['slab', 0.2]]), cover: covered ? 'board' : 'open', gel: full ? 'full' : 'none' },
    numbers: {
      waterToLye: ratio, superfatPct: superfat, fragrancePct: 3 + 0.5 * normalDraw(random), oilTemperatureC: oil,
      ...(random.next() < 0.9 ? { lyeTemperatureC: oil + 3 * normalDraw(random) } : {}), roomTemperatureC: room,
      ...(random.next() < 0.8 ? { humidityPct: humidity } : {}), blendSeconds: blend, cutHours: cut,
    },
    holds: { colourant: white ? ['white'] : [], fragranceLot: [lot], fatLot: [fat] },
    outcomes: {},
  };
  const chances = {
    acceleration: logistic(hot ? -6 : -3.2 + (bad ? 4 : 0) + 0.012 * (blend - 45)),
    ricing: logistic(hot ? -5.5 : -3.6 + (bad ? 2.8 : 0)),
    'soda-ash': logistic(hot ? -3.6 : 0.15 + 4 * (ratio - 2) - (full ? 1.6 : 0) - (covered ? 0.7 : 0)),
    'glycerin-rivers': logistic(hot ? -4.2 : -3 + (full ? 1.7 : 0) + (white ? 1.4 : 0) + 2.5 * (ratio - 2)),
    'air-pockets': logistic(hot ? (method === 'hot' ? -0.4 : -1.6) : -2.7),
    'drag-marks': logistic(-1.9 + 0.03 * (cut - 24) + (hot ? 0.7 : 0)),
    'orange-spots': logistic(-3.9 + (fat === BAD_FAT ? 3.1 : 0)),
    sweating: logistic(-3 + 0.12 * (humidity - 58)),
  };
  return { row, chances, skips: maker === 'tomasz' ? 0.12 : 0.04 };
}

export function simulatedWorkshop({ seed, batches, faults = namedFaults, permuted = false }: WorkshopSettings): readonly BatchRow[] {
  const random = randomFrom(seed);
  const made = Array.from({ length: batches }, (_, index) => makeBatch(random, index, batches));
  const answers = faults.map((fault) => {
    const dealt = made.map(({ row, chances, skips }): Outcome | null => {
      const chance = chances[fault.slug] ?? logistic(row.family === 'hot' ? -2.5 : -3.1);
      const found = random.next() < chance;
      return random.next() < skips ? null : found ? (random.next() < 0.6 ? 1 : 2) : 0;
    });
    return permuted ? shuffled(dealt, random) : dealt;
  });
  return made.map(({ row }, i) => Object.freeze({
    ...row,
    outcomes: Object.freeze(Object.fromEntries(faults.flatMap((fault, k) => (answers[k]![i] === null ? [] : [[fault.slug, answers[k]![i]!]])))),
  }));
}
