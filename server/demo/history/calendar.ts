import { addDays, weekday } from '#shared/units/days.ts';

/** The story runs 104 weeks and ends on the day before the demo is shown. */
export const weeksOfStory = 104;

/** First day of week 1, for a demo shown on `today`. */
export function storyStart(today: string): string {
  return addDays(today, -7 * weeksOfStory);
}

export function weekOf(startsOn: string, week: number): string {
  return addDays(startsOn, 7 * (week - 1));
}

/** Mondays to Fridays of a span of weeks, both included. */
export function workingDays(startsOn: string, [first, last]: [number, number]): string[] {
  const days: string[] = [];
  const monday = 1 - weekday(startsOn);
  for (let n = 7 * (first - 1); n < 7 * last; n += 1) {
    // Counted from the Monday at or before the start.
    if ((((n - monday) % 7) + 7) % 7 < 5) days.push(addDays(startsOn, n));
  }
  return days;
}

/** Before Christmas the workshop pours more, in August less. */
export function seasonWeight(day: string): number {
  const monthDay = day.slice(5);
  if (monthDay >= '10-01' && monthDay <= '12-15') return 1.4;
  return monthDay.startsWith('08') ? 0.6 : 1;
}

/** Day of the year, 1 for the first of January. */
export function dayOfYear(day: string): number {
  let n = Number(day.slice(8));
  const lengths = [31, Number(day.slice(0, 4)) % 4 === 0 ? 29 : 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
  for (let month = 0; month < Number(day.slice(5, 7)) - 1; month += 1) n += lengths[month] ?? 0;
  return n;
}

const clocks = new Map<string, Intl.DateTimeFormat>();
const offsets = new Map<string, number>();

/** Minutes the zone is ahead of UTC at noon of a day; the workshop works by day, so noon is near enough. */
export function offsetMinutes(day: string, timeZone: string): number {
  const key = `${timeZone}/${day}`;
  const known = offsets.get(key);
  if (known !== undefined) return known;
  const clock = clocks.get(timeZone) ?? new Intl.DateTimeFormat('en-GB', { timeZone, hour: '2-digit', minute: '2-digit', hourCycle: 'h23' });
  clocks.set(timeZone, clock);
  const parts = clock.formatToParts(new Date(`${day}T12:00:00Z`));
  const part = (type: string) => Number(parts.find((p) => p.type === type)?.value ?? 0);
  const ahead = (((part('hour') - 12) * 60 + part('minute') + 720) % 1440) - 720;
  offsets.set(key, ahead);
  return ahead;
}

/** An instant from a day and minutes after its midnight, on the clock of the workshop; later than 24 h runs into the next days. */
export function instantAt(day: string, minutes: number, timeZone: string): string {
  const onDay = addDays(day, Math.floor(minutes / 1440));
  const left = Math.round(minutes - 1440 * Math.floor(minutes / 1440));
  const utc = Date.parse(`${onDay}T00:00:00Z`) + (left - offsetMinutes(onDay, timeZone)) * 60_000;
  return new Date(utc).toISOString();
}
