import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { lotBehaviourApi, type BehavingKind } from '#shared/lot-behaviour.ts';
import { lotsApi, type NewLot, type SetLotStanding } from '#shared/lots.ts';
import type { LotStanding, MaterialKind } from '#shared/words/lot-words.ts';
import { allPages } from '#src/lib/all-pages.ts';
import { call } from '#src/lib/call.ts';
import { invalidateAfter } from '#src/lib/query-client.ts';

/** Every lot, newest first, for pickers. */
export const lotPickerQuery = queryOptions({
  queryKey: ['lots', 'picker'],
  queryFn: ({ signal }) => allPages((cursor) => call(lotsApi.list, { query: { limit: '200', cursor }, signal })),
});

export function lotsQuery(filter: { kind?: MaterialKind | undefined; standing?: LotStanding | undefined }) {
  return queryOptions({ queryKey: ['lots', 'list', filter], queryFn: ({ signal }) => allPages((cursor) => call(lotsApi.list, { query: { ...filter, limit: '200', cursor }, signal })) });
}

export function lotQuery(lotId: string) {
  return queryOptions({ queryKey: ['lots', 'one', lotId], queryFn: ({ signal }) => call(lotsApi.read, { params: { lotId }, signal }) });
}

export function standingChangesQuery(lotId: string) {
  return queryOptions({ queryKey: ['lots', 'standing-changes', lotId], queryFn: async ({ signal }) => (await call(lotsApi.standingChanges, { params: { lotId }, signal })).items });
}

/** How the lots of a kind behave; only some kinds are compared. */
export function lotsBehaviourQuery(kind: BehavingKind) {
  return queryOptions({ queryKey: ['lots', 'behaviour', 'all', kind], queryFn: ({ signal }) => call(lotBehaviourApi.all, { query: { kind }, signal }), staleTime: 60_000 });
}

export function lotBehaviourQuery(lotId: string) {
  return queryOptions({ queryKey: ['lots', 'behaviour', 'one', lotId], queryFn: ({ signal }) => call(lotBehaviourApi.one, { params: { lotId }, signal }), staleTime: 60_000 });
}

export function useSetLotStanding(lotId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ version, ...body }: SetLotStanding & { version: number }) => call(lotsApi.setStanding, { params: { lotId }, body, version }),
    onSuccess: (lot) => {
      client.setQueryData(lotQuery(lotId).queryKey, lot);
      return invalidateAfter(client, 'lots');
    },
  });
}

export function useAddLot() {
  const client = useQueryClient();
  return useMutation({ mutationFn: (wish: z.input<typeof NewLot>) => call(lotsApi.create, { body: wish }), onSuccess: () => invalidateAfter(client, 'lots') });
}
