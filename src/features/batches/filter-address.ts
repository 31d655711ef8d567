import { BatchesChoice } from '#shared/batches.ts';
import type { BatchesAsk } from './batches.queries.ts';

const FIELDS = Object.keys(BatchesChoice.shape) as (keyof BatchesChoice)[];
/** What the server takes when nothing is said; never written into an address. */
const SILENT: BatchesAsk = { sort: 'made', order: 'desc' };

/** The filter in an address. A part that makes no sense is left out, so an old link still opens. */
export function askFromAddress(search: URLSearchParams): BatchesAsk {
  const ask: Record<string, unknown> = {};
  for (const field of FIELDS) {
    const text = search.get(field);
    if (text === null || text === '') continue;
    const read = BatchesChoice.shape[field].safeParse(text);
    const isEmptyList = Array.isArray(read.data) && read.data.length === 0;
    if (read.success && read.data !== SILENT[field] && !isEmptyList) ask[field] = read.data;
  }
  return ask;
}

/** The address of a filter: the same filter always gives the same text, and nothing is written that goes without saying. */
export function addressOfAsk(ask: BatchesAsk): URLSearchParams {
  const search = new URLSearchParams();
  for (const field of FIELDS) {
    const value = ask[field];
    if (value === undefined || value === '' || value === SILENT[field] || (Array.isArray(value) && value.length === 0)) continue;
    search.set(field, Array.isArray(value) ? value.join(',') : value);
  }
  return search;
}

/** Whether anything narrows the log; the order does not. */
export function isNarrowed({ sort: _sort, order: _order, ...rest }: BatchesAsk): boolean {
  return addressOfAsk(rest).size > 0;
}
