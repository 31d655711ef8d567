import { queryOptions } from '@tanstack/react-query';
import { causesApi, type CausesFilter } from '#shared/causes.ts';
import { call } from '#src/lib/call.ts';

/** What is counted, as it stands in an address. */
export type CountedAsk = CausesFilter;

/** The board of what is counted; the server keeps it, so it is asked again whenever something was written. */
export function boardQuery(ask: CountedAsk) {
  return queryOptions({ queryKey: ['causes', 'board', ask], queryFn: ({ signal }) => call(causesApi.board, { query: ask, signal }), staleTime: 60_000 });
}

export interface CauseAsk extends CountedAsk {
  fault: string;
  input: string;
  level?: string | undefined;
}

export function causeQuery({ fault, input, level, ...ask }: CauseAsk) {
  return queryOptions({ queryKey: ['causes', 'one', fault, input, level ?? null, ask], queryFn: ({ signal }) => call(causesApi.one, { params: { fault, input }, query: { ...ask, level }, signal }), staleTime: 60_000 });
}

/** Every batch behind a cause, at most 1,000. */
export function behindQuery({ fault, input, level, ...ask }: CauseAsk) {
  return queryOptions({ queryKey: ['causes', 'behind', fault, input, level ?? null, ask], queryFn: ({ signal }) => call(causesApi.batches, { params: { fault, input }, query: { ...ask, level }, signal }), staleTime: 60_000 });
}
