import { useQuery } from '@tanstack/react-query';
import { useNavigate, useParams } from 'react-router-dom';
import { EmptyState, ErrorState, LoadingShape, NotAllowed } from '#src/components/states.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { ClaimForm } from '#src/features/claims/ClaimForm.tsx';
import { claimQuery } from '#src/features/claims/claims.queries.ts';
import { ClaimSheet } from '#src/features/claims/ClaimSheet.tsx';
import { useMay } from '#src/features/session/session.queries.ts';
import { paths } from '../paths.ts';

/** One claim: what goes out on the left, the sheet itself on the right. */
export function Component() {
  const { claimId = 'new' } = useParams();
  const isNew = claimId === 'new';
  const claim = useQuery({ ...claimQuery(claimId), enabled: !isNew });
  const may = useMay();
  const navigate = useNavigate();
  const toasts = useToasts();
  if (!isNew && claim.isPending) return <LoadingShape says="Fetching the claim" rows={10} />;
  if (claim.isError) return <ErrorState error={claim.error} onRetry={() => void claim.refetch()} />;
  return (
    <div className="grid grid-cols-1 gap-6">
      <h1>{claim.data ? `Claim ${claim.data.number}, ${claim.data.title}` : 'New claim'}</h1>
      <div className="grid grid-cols-1 gap-9 bench:grid-cols-[26rem_minmax(0,1fr)]">
        {may('claim.draft') ? (
          <ClaimForm key={claim.data?.version ?? 0} {...(claim.data ? { claim: claim.data } : {})} onKept={(kept) => { toasts.tell(`Claim ${kept.number} is kept`); if (isNew) void navigate(paths.claim(kept.id), { replace: true }); }} />
        ) : <NotAllowed>Owners and makers draft claims.</NotAllowed>}
        {claim.data ? <ClaimSheet claim={claim.data} canTakeOut={may('claim.draft')} /> : <EmptyState title="The sheet appears here">Choose supplier, lots and faults, then draft the claim: nothing goes out by itself.</EmptyState>}
      </div>
    </div>
  );
}
