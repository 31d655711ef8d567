/**
 * Arithmetic on calendar days written YYYY-MM-DD. A day has no time and no zone,
 * so it is counted in whole days and never passes through an instant.
 */

const pattern = /^(\d{4})-(\d{2})-(\d{2})$/;

/**
 * Days since 1970-01-01, negative before it.
 *
 * @throws RangeError when the text is not a day that exists
 *
 * Source: proleptic Gregorian calendar, counted from March so that leap days fall at the end of a year.
 */
export function dayNumber(day: string): number {
  const match = pattern.exec(day);
  if (!match) throw new RangeError(`a day is written YYYY-MM-DD, got "${day}"`);
  const [year, month, date] = [Number(match[1]), Number(match[2]), Number(match[3])];
  const y = month <= 2 ? year - 1 : year;
  const era = Math.floor(y / 400);
  const yearOfEra = y - era * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + date - 1;
  const dayOfEra = yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  const number = era * 146_097 + dayOfEra - 719_468;
  if (dayFromNumber(number) !== day) throw new RangeError(`there is no day "${day}"`);
  return number;
}

/** The day that many days after 1970-01-01. */
export function dayFromNumber(number: number): string {
  const z = number + 719_468;
  const era = Math.floor(z / 146_097);
  const doe = z - era * 146_097;
  const yoe = Math.floor((doe - Math.floor(doe / 1460) + Math.floor(doe / 36_524) - Math.floor(doe / 146_096)) / 365);
  const doy = doe - (365 * yoe + Math.floor(yoe / 4) - Math.floor(yoe / 100));
  const mp = Math.floor((5 * doy + 2) / 153);
  const month = mp < 10 ? mp + 3 : mp - 9;
  const year = yoe + era * 400 + (month <= 2 ? 1 : 0);
  const two = (n: number) => String(n).padStart(2, '0');
  return `${String(year).padStart(4, '0')}-${two(month)}-${two(doy - Math.floor((153 * mp + 2) / 5) + 1)}`;
}

/** The day `days` after (or, negative, before) another. */
export function addDays(day: string, days: number): string {
  return dayFromNumber(dayNumber(day) + days);
}

/** Whole days from one day to another; negative when `to` is earlier. */
export function daysBetween(from: string, to: string): number {
  return dayNumber(to) - dayNumber(from);
}

/** 1 is Monday, 7 is Sunday. */
export function weekday(day: string): number {
  return ((((dayNumber(day) + 3) % 7) + 7) % 7) + 1;
}
