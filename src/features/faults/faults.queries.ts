import { queryOptions } from '@tanstack/react-query';
import { faultsApi } from '#shared/faults.ts';
import { call } from '#src/lib/call.ts';

/** The catalogue changes with the server only. */
export const faultsQuery = queryOptions({
  queryKey: ['faults', 'catalogue'],
  queryFn: async ({ signal }) => (await call(faultsApi.list, { signal })).items,
  staleTime: Infinity,
});
