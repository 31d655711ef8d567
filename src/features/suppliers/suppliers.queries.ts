import { queryOptions } from '@tanstack/react-query';
import { suppliersApi } from '#shared/suppliers.ts';
import { allPages } from '#src/lib/all-pages.ts';
import { call } from '#src/lib/call.ts';

/** Every supplier by name, for pickers. */
export const supplierPickerQuery = queryOptions({
  queryKey: ['suppliers', 'picker'],
  queryFn: ({ signal }) => allPages((cursor) => call(suppliersApi.list, { query: { limit: '200', cursor }, signal })),
});
