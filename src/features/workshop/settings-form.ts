import { ChangeWorkshop, type WorkshopView } from '#shared/workshop.ts';

/** What is typed, as text. */
export interface SettingsTyped {
  name: string;
  timeZone: string;
  currency: string;
  batchPrefix: string;
  firstPriceMinor: string;
  secondPriceMinor: string;
}

export const SETTINGS_FIELDS = ['name', 'timeZone', 'currency', 'batchPrefix', 'firstPriceMinor', 'secondPriceMinor'] as const;

export const SETTINGS_LABELS: Record<keyof SettingsTyped, string> = {
  name: 'Name of the workshop', timeZone: 'Time zone', currency: 'Currency', batchPrefix: 'Batch codes begin with',
  firstPriceMinor: 'Price of a first', secondPriceMinor: 'Price of a second',
};

/** Currencies whose money has two decimals: prices are kept in hundredths. */
export const CURRENCIES = ['EUR', 'GBP', 'USD', 'AUD', 'BRL', 'CAD', 'CHF', 'CZK', 'DKK', 'HKD', 'ILS', 'INR', 'MXN', 'NOK', 'NZD', 'PLN', 'RON', 'SEK', 'SGD', 'TRY', 'ZAR'] as const;

function priceText(minor: number | null): string {
  return minor === null ? '' : (minor / 100).toFixed(2);
}

export function typedFrom(workshop: WorkshopView): SettingsTyped {
  const { name, timeZone, currency, batchPrefix } = workshop;
  return { name, timeZone, currency, batchPrefix, firstPriceMinor: priceText(workshop.firstPriceMinor), secondPriceMinor: priceText(workshop.secondPriceMinor) };
}

/** Hundredths from "7.50" or "7,5"; null from nothing; undefined from what is no price. */
export function minorFrom(text: string): number | null | undefined {
  const plain = text.trim().replace(',', '.');
  if (plain === '') return null;
  return /^\d{1,5}(?:\.\d{1,2})?$/.test(plain) ? Math.round(Number(plain) * 100) : undefined;
}

type Read = { change: ChangeWorkshop } | { problems: { field: keyof SettingsTyped; says: string }[] };

/** The change in what was typed, or what is wrong with it, field by field. */
export function readTyped(typed: SettingsTyped): Read {
  const [first, second] = [minorFrom(typed.firstPriceMinor), minorFrom(typed.secondPriceMinor)];
  const says = 'A price looks like 7.50';
  const problems: { field: keyof SettingsTyped; says: string }[] = [];
  if (first === undefined) problems.push({ field: 'firstPriceMinor', says });
  if (second === undefined) problems.push({ field: 'secondPriceMinor', says });
  const read = ChangeWorkshop.safeParse({ ...typed, firstPriceMinor: first ?? null, secondPriceMinor: second ?? null });
  if (!read.success) problems.push(...read.error.issues.map(({ path, message }) => ({ field: String(path[0]) as keyof SettingsTyped, says: message })));
  return read.success && problems.length === 0 ? { change: read.data } : { problems };
}
