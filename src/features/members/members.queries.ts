import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { membersApi, type AcceptInvitation, type ChangeMember, type Invite } from '#shared/members.ts';
import { call } from '#src/lib/call.ts';
import { invalidateAfter } from '#src/lib/query-client.ts';

/** Everybody of the workshop by name, for pickers. */
export const membersQuery = queryOptions({
  queryKey: ['members', 'list'],
  queryFn: async ({ signal }) => (await call(membersApi.list, { signal })).items,
});

/** Everybody with their address; the owner's. */
export const memberDetailsQuery = queryOptions({
  queryKey: ['members', 'details'],
  queryFn: async ({ signal }) => (await call(membersApi.details, { signal })).items,
});

/** What an invitation offers; an answer of 404 stands for used, past its time and unknown alike. */
export function invitationQuery(token: string) {
  return queryOptions({
    queryKey: ['session', 'invitation', token],
    queryFn: ({ signal }) => call(membersApi.readInvitation, { params: { token }, signal }),
    retry: false,
    staleTime: Infinity,
  });
}

export function useInvite() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (wish: Invite) => call(membersApi.invite, { body: wish }),
    onSuccess: () => Promise.all([invalidateAfter(client, 'members'), client.invalidateQueries({ queryKey: ['outbox'] })]),
  });
}

export function useAcceptInvitation() {
  return useMutation({ mutationFn: (wish: AcceptInvitation) => call(membersApi.accept, { body: wish }) });
}

export function useChangeMember() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ memberId, version, change }: { memberId: string; version: number; change: ChangeMember }) => call(membersApi.change, { params: { memberId }, version, body: change }),
    onSettled: () => invalidateAfter(client, 'members'),
  });
}
