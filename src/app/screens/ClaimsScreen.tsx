import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { BlockLink } from '#src/components/Block.tsx';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { Flag } from '#src/components/Flag.tsx';
import { LotTag } from '#src/components/LotTag.tsx';
import { EmptyState, ErrorState, LoadingShape } from '#src/components/states.tsx';
import { claimsQuery } from '#src/features/claims/claims.queries.ts';
import { useMay } from '#src/features/session/session.queries.ts';
import { paths } from '../paths.ts';

/** Claims against suppliers, newest first. */
export function Component() {
  const claims = useQuery(claimsQuery);
  const may = useMay();
  const draft = may('claim.draft') && <BlockLink to={paths.claim('new')} kind="main">Draft a claim</BlockLink>;
  return (
    <div className="grid grid-cols-1 gap-6">
      <div className="flex flex-wrap items-center justify-between gap-4"><h1>Claims</h1>{draft}</div>
      {claims.isPending && <LoadingShape says="Fetching the claims" />}
      {claims.isError && <ErrorState error={claims.error} onRetry={() => void claims.refetch()} />}
      {claims.data?.length === 0 && <EmptyState title="No claim is drafted" act={draft}>A claim names a supplier’s lots and the faults seen with them, and hands over every batch that held them, the good ones too. No formula leaves the workshop.</EmptyState>}
      {claims.data && claims.data.length > 0 && (
        <ul className="border-t-2 border-ink">
          {claims.data.map((claim) => (
            <li key={claim.id} className="flex flex-wrap items-center gap-x-4 gap-y-1.5 border-b border-line py-2.5">
              <Link to={paths.claim(claim.id)} className="flex min-h-10 items-center font-[640]">{claim.number}. {claim.title}</Link>
              <span className="text-row text-ink-2">{claim.supplierName}</span>
              <span className="flex flex-wrap gap-1.5">{claim.lots.map((lot) => <LotTag key={lot.id} code={lot.code} />)}</span>
              <span className="flex gap-1.5">{claim.faults.map((fault) => <FaultMark key={fault} fault={fault} name={fault} />)}</span>
              <span className="ml-auto"><Flag kind="draft">draft</Flag></span>
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}
