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
