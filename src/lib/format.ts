/** Thin space between thousands, true minus sign. */
function dressed(text: string): string {
  return text.replaceAll(',', '\u202F').replace('-', '\u2212');
}

/** A number with a fixed count of decimals. */
export function formatNumber(value: number, decimals = 0): string {
  return dressed(value.toLocaleString('en-GB', { minimumFractionDigits: decimals, maximumFractionDigits: decimals }));
}

/** A fraction as per cent: 0.033 is "3.3 %". */
export function formatPercent(fraction: number, decimals = 1): string {
  return `${formatNumber(fraction * 100, decimals)}\u202F%`;
}

/** Money from whole minor units. */
export function formatMoney(minor: number, currency?: string): string {
  const amount = formatNumber(minor / 100, 2);
  return currency ? `${amount} ${currency}` : amount;
}

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'June', 'July', 'Aug', 'Sept', 'Oct', 'Nov', 'Dec'];
const WEEKDAYS = ['Sunday', 'Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday'];

/** A day `YYYY-MM-DD` as "14 Sept", with the year where it is not `currentYear`. */
export function formatDay(day: string, currentYear?: number): string {
  const [year = '', month = '', date = ''] = day.split('-');
  const short = `${Number(date)} ${MONTHS[Number(month) - 1] ?? month}`;
  return Number(year) === currentYear ? short : `${short} ${year}`;
}

/** "Monday 31 Aug 2026". */
export function formatLongDay(day: string): string {
  const weekday = WEEKDAYS[new Date(`${day}T00:00:00Z`).getUTCDay()] ?? '';
  return `${weekday} ${formatDay(day)}`;
}

/** An instant in the workshop's zone, "14 Sept 2026, 09:30". */
export function formatInstant(instant: string, timeZone?: string): string {
  const parts = new Intl.DateTimeFormat('en-CA', { ...(timeZone ? { timeZone } : {}), year: 'numeric', month: '2-digit', day: '2-digit', hour: '2-digit', minute: '2-digit', hour12: false }).formatToParts(new Date(instant));
  const part = (type: string) => parts.find((candidate) => candidate.type === type)?.value ?? '';
  return `${formatDay(`${part('year')}-${part('month')}-${part('day')}`)}, ${part('hour').replace('24', '00')}:${part('minute')}`;
}

/** Today in a time zone, `YYYY-MM-DD`. */
export function todayIn(timeZone?: string): string {
  return new Intl.DateTimeFormat('en-CA', timeZone ? { timeZone } : {}).format(new Date());
}

/** "1 batch", "3 batches". */
export function formatCount(count: number, one: string, many = `${one}s`): string {
  return `${formatNumber(count)} ${count === 1 ? one : many}`;
}
