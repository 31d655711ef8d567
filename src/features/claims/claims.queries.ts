import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { claimsApi, type ClaimView, type NewClaim } from '#shared/claims.ts';
import { addressOf, call } from '#src/lib/call.ts';

export const claimsQuery = queryOptions({ queryKey: ['claims', 'list'], queryFn: async ({ signal }) => (await call(claimsApi.list, { signal })).items });

export function claimQuery(claimId: string) {
  return queryOptions({ queryKey: ['claims', 'one', claimId], queryFn: ({ signal }) => call(claimsApi.read, { params: { claimId }, signal }) });
}

/** What would go out; anew for every version of the claim. */
export function claimPreviewQuery(claimId: string, version: number) {
  return queryOptions({ queryKey: ['claims', 'preview', claimId, version], queryFn: ({ signal }) => call(claimsApi.preview, { params: { claimId }, signal }) });
}

export function claimFile(claimId: string, file: 'rows' | 'comparison', hasByteOrderMark: boolean): string {
  return addressOf(claimsApi[file], { claimId }, { bom: hasByteOrderMark ? 'yes' : 'no' });
}

/** Drafts a claim, or changes the one that is there. */
export function useKeepClaim(claim: ClaimView | undefined) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, ...wish }: NewClaim) => (claim ? call(claimsApi.change, { params: { claimId: claim.id }, body: wish, version: claim.version }) : call(claimsApi.create, { body: { id, ...wish } })),
    onSuccess: (kept) => {
      client.setQueryData(claimQuery(kept.id).queryKey, kept);
      return client.invalidateQueries({ queryKey: claimsQuery.queryKey });
    },
  });
}
