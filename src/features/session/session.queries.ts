import { queryOptions, useMutation, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { sessionApi, type SessionView } from '#shared/session.ts';
import { roleHas, type Right } from '#shared/words/rights.ts';
import { call } from '#src/lib/call.ts';

/** Who is signed in; the guard of every screen loads it first. */
export const sessionQuery = queryOptions({
  queryKey: ['session', 'me'],
  queryFn: ({ signal }) => call(sessionApi.whoAmI, { signal }),
  staleTime: 60_000,
});

/** Accounts shown on the sign-in page of a demo. */
export const demoAccountsQuery = queryOptions({
  queryKey: ['session', 'demo-accounts'],
  queryFn: ({ signal }) => call(sessionApi.demoAccounts, { signal }),
  retry: false,
});

/** The signed-in person, below the guard. */
export function useSession(): SessionView {
  return useSuspenseQuery(sessionQuery).data;
}

/** Whether the signed-in person has a right. */
export function useMay(): (right: Right) => boolean {
  const { member } = useSession();
  return (right) => roleHas(member.role, right);
}

export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (wish: { email: string; password: string }) => call(sessionApi.signIn, { body: wish }),
    onSuccess: (session) => {
      client.clear();
      client.setQueryData(sessionQuery.queryKey, session);
    },
  });
}

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(sessionApi.signOut),
    onSettled: () => client.clear(),
  });
}
