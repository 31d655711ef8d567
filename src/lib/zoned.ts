/** What a clock in the zone shows at an instant, `YYYY-MM-DDTHH:MM`. */
export function clockIn(instant: string, timeZone: string): string {
  const parts = new Intl.DateTimeFormat('en-CA', { timeZone, year: 'numeric', month: '2-digit', day: '2-digit', hour: '2-digit', minute: '2-digit', hourCycle: 'h23' }).formatToParts(new Date(instant));
  const part = (type: string) => parts.find((candidate) => candidate.type === type)?.value ?? '00';
  return `${part('year')}-${part('month')}-${part('day')}T${part('hour')}:${part('minute')}`;
}

/**
 * The instant at which a clock in the zone shows a time; ISO 8601 with `Z`.
 * In the hour that a clock skips or repeats, one of the two readings.
 */
export function instantAt(clock: string, timeZone: string): string {
  const wanted = Date.parse(`${clock}Z`);
  let instant = wanted;
  // Twice: the first guess may lie on the other side of a change of the clocks.
  for (let round = 0; round < 2; round += 1) instant += wanted - Date.parse(`${clockIn(new Date(instant).toISOString(), timeZone)}Z`);
  return new Date(instant).toISOString();
}
