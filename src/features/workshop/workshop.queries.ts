import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { workshopApi, type ChangeWorkshop } from '#shared/workshop.ts';
import { call } from '#src/lib/call.ts';
import { invalidateAfter } from '#src/lib/query-client.ts';

/** The workshop's settings. */
export const workshopQuery = queryOptions({
  queryKey: ['workshop', 'settings'],
  queryFn: ({ signal }) => call(workshopApi.read, { signal }),
});

export function useChangeWorkshop() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ version, change }: { version: number; change: ChangeWorkshop }) => call(workshopApi.change, { version, body: change }),
    onSuccess: async (view) => {
      client.setQueryData(workshopQuery.queryKey, view);
      await invalidateAfter(client, 'workshop');
    },
  });
}
