import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import type { SeverityGrade } from '#server/features/faults/catalogue/fault-definition.ts';
import { randomOf } from '../random.ts';
import type { Slot } from './schedule.ts';

/** What the story fixes of one batch; the rest is drawn. */
export interface Pin {
  formula?: string;
  formulaVersion?: number;
  mould?: string;
  /** Taken instead of the ordinary lot of the week, by material. */
  lots?: Record<string, string>;
  /** Faults that are settled: with a severity, or plainly absent. Looked for without fail. */
  faults?: Partial<Record<CatalogueSlug, SeverityGrade | 'absent'>>;
  part?: StoryPart;
}

export type StoryPart =
  | 'red-stop' | 'castor-left-out' | 'donor' | 'seized-in-the-pot' | 'seized-then-rebatched' | 'power-cut'
  | 'soft-then-rebatched' | 'soft-milk-then-rebatched';

/** Log numbers that the story names; both must fall on ordinary cold batches. */
export const redStopNumber = 147;
export const castorLeftOutNumber = 93;

const ordinary = new Set(['HL-1102', 'EF-7731', 'EF-7860', 'TF-2251', 'BK-0415', 'BK-0459', 'LS-3310', 'LS-3365']);

/** Whether the draw of days suits the story at all. */
export function suitsTheStory(slots: readonly Slot[]): boolean {
  return [redStopNumber, castorLeftOutNumber].every((number) => {
    const slot = slots[number - 1];
    return slot?.family === 'cold' && (slot.lot === null || ordinary.has(slot.lot));
  });
}

/** The pins of each batch, by its place in the log (0 for the first). */
export function quernbyPins(seed: number, slots: readonly Slot[]): Map<number, Pin> {
  const random = randomOf(seed, 'pins');
  const pins = new Map<number, Pin>();
  const places = (wanted: (slot: Slot) => boolean) => slots.flatMap((slot, at) => (wanted(slot) ? [at] : []));
  const pin = (at: number, more: Pin) => {
    const had = pins.get(at);
    pins.set(at, { ...had, ...more, faults: { ...had?.faults, ...more.faults } });
  };
  const spread = (at: readonly number[], fault: CatalogueSlug, severities: readonly SeverityGrade[], chosen = random.shuffle(at)) => {
    chosen.forEach((place, n) => pin(place, { faults: { [fault]: severities[n] ?? 'absent' } }));
    return chosen;
  };

  const badCold = places((s) => s.lot === 'EF-7802' && s.family === 'cold');
  const fast = spread(badCold, 'acceleration', [3, 2, 2, 2, 2, 1, 1, 1]);
  // Lots that seize move fast first, so the two are among the eight. The rebatch waits until week 41.
  const seized = random.shuffle(fast.slice(0, 5));
  spread(badCold, 'seizing', [3, 2], [...seized, ...badCold.filter((at) => !seized.includes(at))]);
  spread(badCold, 'ricing', [3, 2, 2, 1]);
  const [lost, pressed] = [seized[0], seized[1]];
  if (lost !== undefined) pin(lost, { part: 'seized-in-the-pot' });
  if (pressed !== undefined) pin(pressed, { part: 'seized-then-rebatched' });
  const donor = badCold.find((at) => at !== lost && at !== pressed && pins.get(at)?.faults?.['ricing'] !== 3);
  if (donor !== undefined) pin(donor, { part: 'donor', formula: 'everyday', mould: 'M1' });

  for (const at of places((s) => s.lot === 'EF-7802' && s.family === 'hot')) {
    pin(at, { faults: { acceleration: 'absent', ricing: 'absent', seizing: 'absent' } });
  }
  spread(places((s) => s.lot === 'LA-5560' && s.family === 'cold'), 'seizing', [2, 2]);
  spread(places((s) => s.lot === 'GR-4120'), 'ricing', [2]);
  spread(places((s) => s.lot === 'GR-4188'), 'off-smell', [2, 2, 1]);

  pin(redStopNumber - 1, { part: 'red-stop', formula: 'everyday', formulaVersion: 1, mould: 'M1', lots: { sunflower: 'SU-852' } });
  pin(castorLeftOutNumber - 1, {
    part: 'castor-left-out', formula: 'everyday', mould: 'M1', faults: { 'lye-heavy': 3, 'orange-spots': 'absent', 'scent-fade': 'absent' },
  });
  const free = (at: number) => !pins.has(at);
  const lastPlain = (first: number, last: number) =>
    places((s) => s.family === 'cold' && s.week >= first && s.week <= last && (s.lot === null || ordinary.has(s.lot))).filter(free).at(-1);
  const soft = lastPlain(12, 17);
  if (soft !== undefined) pin(soft, { part: 'soft-then-rebatched', formula: 'high-olive', faults: { 'soft-sticky': 3, 'soda-ash': 'absent' } });
  const softMilk = lastPlain(82, 87);
  if (softMilk !== undefined) pin(softMilk, { part: 'soft-milk-then-rebatched', formula: 'milk-and-oat', faults: { 'soft-sticky': 3 } });
  const cut = places((s) => s.family === 'hot' && s.lot === 'HL-1102').find(free);
  if (cut !== undefined) pin(cut, { part: 'power-cut' });
  return pins;
}

/** How the story settles a fault of a batch, if it does. */
export function pinned(pin: Pin | undefined, fault: CatalogueSlug): SeverityGrade | 'absent' | undefined {
  return pin?.faults?.[fault];
}

