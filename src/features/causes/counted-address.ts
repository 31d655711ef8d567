import { CausesFilter } from '#shared/causes.ts';
import type { CountedAsk } from './causes.queries.ts';

const FIELDS = Object.keys(CausesFilter.shape) as (keyof CausesFilter)[];

/** What is counted, read from an address; a part that makes no sense is left out, so an old link still opens. */
export function countedFromAddress(search: URLSearchParams): CountedAsk {
  const ask: Record<string, string> = {};
  for (const field of FIELDS) {
    const read = CausesFilter.shape[field].safeParse(search.get(field) ?? undefined);
    if (read.success && read.data !== undefined) ask[field] = read.data;
  }
  return ask;
}

/** An address that counts the same, with other parts of it kept. */
export function addressOfCounted(ask: CountedAsk, keep: Readonly<Record<string, string | null | undefined>> = {}): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries({ ...keep, ...ask })) if (value) search.set(name, value);
  const text = search.toString();
  return text ? `?${text}` : '';
}
