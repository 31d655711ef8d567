import { queryOptions } from '@tanstack/react-query';
import { methodComparisonApi } from '#shared/method-comparison.ts';
import { call } from '#src/lib/call.ts';

/** Hot against cold over the batches that are counted. */
export function methodComparisonQuery(ask: { from?: string | undefined; to?: string | undefined; formula?: string | undefined }) {
  return queryOptions({ queryKey: ['methods', 'comparison', ask], queryFn: ({ signal }) => call(methodComparisonApi.compare, { query: ask, signal }), staleTime: 60_000 });
}
