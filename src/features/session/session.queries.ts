import { queryOptions, useMutation, useQueryClient, useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { sessionApi, type ChangePassword, type Preferences, type ResetPassword, type SessionView, type SignUp } from '#shared/session.ts';
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
  staleTime: Infinity,
});

/** Devices that are signed in as this person. */
export const openSessionsQuery = queryOptions({
  queryKey: ['session', 'all'],
  queryFn: async ({ signal }) => (await call(sessionApi.openSessions, { signal })).items,
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

/** Nothing of an earlier person or workshop stays in memory. */
function startOver(client: QueryClient, session: SessionView): void {
  client.clear();
  client.setQueryData(sessionQuery.queryKey, session);
}

export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (wish: { email: string; password: string; workshopId?: string | undefined }) => call(sessionApi.signIn, { body: wish }),
    onSuccess: (session) => startOver(client, session),
  });
}

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(sessionApi.signOut),
    onSettled: () => client.clear(),
  });
}

export function useSwitchWorkshop() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (workshopId: string) => call(sessionApi.switchWorkshop, { body: { workshopId } }),
    onSuccess: (session) => startOver(client, session),
  });
}

export function useSignUp() {
  return useMutation({ mutationFn: (wish: SignUp) => call(sessionApi.signUp, { body: wish }) });
}

export function useAskReset() {
  return useMutation({ mutationFn: (email: string) => call(sessionApi.askReset, { body: { email } }) });
}

export function useResetPassword() {
  return useMutation({ mutationFn: (wish: ResetPassword) => call(sessionApi.resetPassword, { body: wish }) });
}

export function useChangePassword() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (wish: ChangePassword) => call(sessionApi.changePassword, { body: wish }),
    onSuccess: () => client.invalidateQueries({ queryKey: openSessionsQuery.queryKey }),
  });
}

/** Units and keys show at once and go back when the server says no. */
export function useSetPreferences() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (wish: Preferences) => call(sessionApi.setPreferences, { body: wish }),
    onMutate: (wish) => {
      const before = client.getQueryData(sessionQuery.queryKey);
      if (before) client.setQueryData(sessionQuery.queryKey, { ...before, account: { ...before.account, ...wish } });
      return { before };
    },
    onError: (_error, _wish, context) => client.setQueryData(sessionQuery.queryKey, context?.before),
    onSuccess: (session) => client.setQueryData(sessionQuery.queryKey, session),
  });
}

export function useEndSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (key: string) => call(sessionApi.endSession, { params: { key } }),
    onSettled: () => client.invalidateQueries({ queryKey: openSessionsQuery.queryKey }),
  });
}
