import { type Random, randomOf } from '../random.ts';
import { seasonWeight, weekOf, workingDays } from './calendar.ts';
import { quernbyScentLots, rebatchWeeks, unscented } from './quernby-scent-lots.ts';
import { daysBetween } from '#shared/units/days.ts';

/** A batch before anything but its day, family and scent is settled. */
export interface Slot {
  family: 'cold' | 'hot' | 'rebatch';
  lot: string | null;
  madeOn: string;
  week: number;
  /** Who made it, where the story says so. */
  maker?: string;
}

/**
 * Days on which each lot was poured, in the order of the log.
 * At most two batches fall on one day.
 */
export function quernbySchedule(seed: number, startsOn: string): Slot[] {
  const taken = new Map<string, number>();
  const slots: Slot[] = [];
  const add = (random: Random, days: string[], slot: Omit<Slot, 'madeOn' | 'week'>) => {
    const free = days.filter((day) => (taken.get(day) ?? 0) < 2);
    const madeOn = random.weighted(free.map((day) => [day, seasonWeight(day)] as const));
    taken.set(madeOn, (taken.get(madeOn) ?? 0) + 1);
    slots.push({ ...slot, madeOn, week: 1 + Math.floor(daysBetween(startsOn, madeOn) / 7) });
  };

  rebatchWeeks.forEach((week, n) => add(randomOf(seed, 'rebatch', n), workingDays(startsOn, [week, week]), { family: 'rebatch', lot: null, maker: n % 2 === 0 ? 'ilse' : 'priya' }));
  for (const lot of quernbyScentLots) {
    const random = randomOf(seed, 'schedule', lot.code);
    const closed = lot.notInWeeks;
    const [from, to] = closed ? [weekOf(startsOn, closed[0]), weekOf(startsOn, closed[1] + 1)] : ['', ''];
    const daysIn = (weeks: [number, number]) => workingDays(startsOn, weeks).filter((day) => !closed || day < from || day >= to);
    const coldDays = daysIn(lot.cold.weeks);
    const hotDays = daysIn(lot.hot.weeks);
    for (let n = 0; n < lot.cold.count; n += 1) {
      const named = lot.cold.byTomasz === undefined ? undefined : n < lot.cold.byTomasz ? 'tomasz' : 'ilse';
      add(random, coldDays, { family: 'cold', lot: lot.code, ...(named ? { maker: named } : {}) });
    }
    for (let n = 0; n < lot.hot.count; n += 1) {
      add(random, hotDays, { family: 'hot', lot: lot.code, ...(lot.hot.onlyPriya ? { maker: 'priya' } : {}) });
    }
  }
  const random = randomOf(seed, 'schedule', 'unscented');
  const anyDays = workingDays(startsOn, unscented.weeks);
  for (let n = 0; n < unscented.count; n += 1) add(random, anyDays, { family: 'cold', lot: null });
  return slots.sort((a, b) => (a.madeOn < b.madeOn ? -1 : a.madeOn > b.madeOn ? 1 : 0));
}
