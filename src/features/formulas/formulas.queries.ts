import { queryOptions } from '@tanstack/react-query';
import { formulasApi } from '#shared/formulas.ts';
import { allPages } from '#src/lib/all-pages.ts';
import { call } from '#src/lib/call.ts';

/** Every formula by name, for pickers. */
export const formulaPickerQuery = queryOptions({
  queryKey: ['formulas', 'picker'],
  queryFn: ({ signal }) => allPages((cursor) => call(formulasApi.list, { query: { limit: '200', cursor }, signal })),
});
