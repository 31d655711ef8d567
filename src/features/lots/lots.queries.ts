import { queryOptions } from '@tanstack/react-query';
import { lotsApi } from '#shared/lots.ts';
import { allPages } from '#src/lib/all-pages.ts';
import { call } from '#src/lib/call.ts';

/** Every lot, newest first, for pickers. */
export const lotPickerQuery = queryOptions({
  queryKey: ['lots', 'picker'],
  queryFn: ({ signal }) => allPages((cursor) => call(lotsApi.list, { query: { limit: '200', cursor }, signal })),
});
