import { queryOptions } from '@tanstack/react-query';
import { membersApi } from '#shared/members.ts';
import { call } from '#src/lib/call.ts';

/** Everybody of the workshop by name, for pickers. */
export const membersQuery = queryOptions({
  queryKey: ['members', 'list'],
  queryFn: async ({ signal }) => (await call(membersApi.list, { signal })).items,
});
