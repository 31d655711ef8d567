const calendars = new Map<string, Intl.DateTimeFormat>();

/**
 * The calendar day, YYYY-MM-DD, that a clock in the zone shows at an instant.
 *
 * @param timeZone IANA name such as `Europe/London`
 * @throws RangeError for a zone that does not exist
 */
export function dayIn(timeZone: string, instant: Date): string {
  const known = calendars.get(timeZone);
  const calendar = known ?? new Intl.DateTimeFormat('en-US', { timeZone, calendar: 'gregory', year: 'numeric', month: '2-digit', day: '2-digit' });
  if (!known) calendars.set(timeZone, calendar);
  const part = Object.fromEntries(calendar.formatToParts(instant).map(({ type, value }) => [type, value]));
  return `${String(part['year']).padStart(4, '0')}-${part['month']}-${part['day']}`;
}

/**
 * The instant at which a clock in the zone shows a day and time; in the hour that comes twice, the earlier one.
 *
 * @param localTime `YYYY-MM-DDTHH:MM:SS`
 */
export function instantIn(timeZone: string, localTime: string): Date {
  const asUtc = Date.parse(`${localTime}Z`);
  // The zone's offset is read at the guess and once more at the mended guess, which settles it but for the missing hour of spring.
  const once = asUtc - aheadMs(timeZone, asUtc);
  return new Date(asUtc - aheadMs(timeZone, once));
}

const clocks = new Map<string, Intl.DateTimeFormat>();

function aheadMs(timeZone: string, instant: number): number {
  const known = clocks.get(timeZone);
  const clock = known ?? new Intl.DateTimeFormat('en-US', { timeZone, hourCycle: 'h23', year: 'numeric', month: '2-digit', day: '2-digit', hour: '2-digit', minute: '2-digit', second: '2-digit' });
  if (!known) clocks.set(timeZone, clock);
  const part = Object.fromEntries(clock.formatToParts(new Date(instant)).map(({ type, value }) => [type, value]));
  return Date.parse(`${part['year']}-${part['month']}-${part['day']}T${part['hour']}:${part['minute']}:${part['second']}Z`) - Math.floor(instant / 1000) * 1000;
}
