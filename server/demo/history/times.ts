import { addDays, weekday } from '#shared/units/days.ts';
import { type Random, within } from '../random.ts';
import type { BatchInputs } from './types.ts';

const openAt = 7 * 60;
const closeAt = 20 * 60;

/** Days and minutes on the workshop's clock at which a batch was poured, unmoulded and cut. */
export interface BatchTimes { pourMinutes: number; unmouldedOn: string; unmouldMinutes: number; mouldHours: number; cutOn: string; cutMinutes: number }

/**
 * Chooses the time of the pour so that the cut falls into hours at which
 * somebody is there; the hours between the two are an input and stay as drawn.
 * A loaf that would leave its mould at night leaves it just before the cut.
 */
export function timesOf(r: Random, madeOn: string, inputs: Pick<BatchInputs, 'cutHours' | 'mouldHours'>): BatchTimes {
  const wait = Math.round(inputs.cutHours * 60);
  const start = r.whole(0, 40);
  const tries = Array.from({ length: 41 }, (_, n) => 8 * 60 + 10 + ((n + start) % 41) * 14);
  const late = (minutes: number) => {
    const clock = (minutes + wait) % 1440;
    return Math.max(0, openAt - clock, clock - closeAt);
  };
  const pourMinutes = tries.reduce((best, minutes) => (late(minutes) < late(best) ? minutes : best));
  const cut = pourMinutes + wait;
  const wished = pourMinutes + Math.round(inputs.mouldHours * 60);
  const atNight = wished % 1440 < openAt || wished % 1440 > closeAt;
  const unmould = atNight ? cut - r.whole(15, 45) : wished;
  return {
    pourMinutes, cutOn: addDays(madeOn, Math.floor(cut / 1440)), cutMinutes: cut % 1440,
    unmouldedOn: addDays(madeOn, Math.floor(unmould / 1440)), unmouldMinutes: unmould % 1440, mouldHours: Number(((unmould - pourMinutes) / 60).toFixed(1)),
  };
}

/** Tuesdays and Fridays the inspector is in; one of them falls into every five days. */
export function rackDay(r: Random, from: string, to: string): { day: string; isInspectorIn: boolean } {
  const days: string[] = [];
  for (let day = from; day <= to; day = addDays(day, 1)) days.push(day);
  const inspectorDays = days.filter((day) => [2, 5].includes(weekday(day)));
  const working = days.filter((day) => weekday(day) <= 5);
  const isInspectorIn = r.chance(0.85) && inspectorDays.length > 0;
  return { day: r.pick(isInspectorIn ? inspectorDays : working.length > 0 ? working : days), isInspectorIn };
}

/** Minutes after midnight of an ordinary look. */
export function lookMinutes(r: Random): number {
  return Math.round(within(r.normal(13 * 60, 130), 8 * 60 + 15, 17 * 60 + 50));
}
