import { queryOptions } from '@tanstack/react-query';
import { materialsApi } from '#shared/materials.ts';
import { allPages } from '#src/lib/all-pages.ts';
import { call } from '#src/lib/call.ts';

/** Every material by name, for pickers. */
export const materialPickerQuery = queryOptions({
  queryKey: ['materials', 'picker'],
  queryFn: ({ signal }) => allPages((cursor) => call(materialsApi.list, { query: { limit: '200', cursor }, signal })),
});
