import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { Link, useNavigate, useParams, useSearchParams } from 'react-router-dom';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { ErrorState, LoadingShape } from '#src/components/states.tsx';
import { BatchesBehind } from '#src/features/causes/BatchesBehind.tsx';
import { BeforeYouAct } from '#src/features/causes/BeforeYouAct.tsx';
import { causeQuery } from '#src/features/causes/causes.queries.ts';
import { CauseSentence } from '#src/features/causes/CauseSentence.tsx';
import { addressOfCounted, countedFromAddress } from '#src/features/causes/counted-address.ts';
import { CountingSentence } from '#src/features/causes/CountingSentence.tsx';
import { DoseChart } from '#src/features/causes/DoseChart.tsx';
import { OddsRows } from '#src/features/causes/OddsRows.tsx';
import { StrataTable } from '#src/features/causes/StrataTable.tsx';
import { useKeys } from '#src/lib/keys.ts';
import { paths } from '../paths.ts';

/** One cause opened: its sentence, what it rests on, and the batches behind every figure. */
export function Component() {
  const { fault = '', input = '' } = useParams();
  const [search, setSearch] = useSearchParams();
  const navigate = useNavigate();
  const level = search.get('level') ?? undefined;
  const counted = useMemo(() => countedFromAddress(search), [search]);
  const ask = { ...counted, fault, input, level };
  const cause = useQuery(causeQuery(ask));
  const back = `${paths.causes}${addressOfCounted(counted)}`;
  const place = `${fault} ${input} ${level ?? ''}`;
  const keys = useMemo(() => ({ Escape: () => void navigate(back, { state: place }) }), [navigate, back, place]);
  useKeys(keys);
  const crumbs = (
    <nav aria-label="Where this is" className="mb-1 flex flex-wrap items-center gap-1.5 text-row">
      <Link to={back} state={place} className="font-[560] coarse:py-2.5">Causes</Link>
      {cause.data && <><span aria-hidden="true">/</span><FaultMark fault={fault} name={cause.data.fault.name} withName /><span aria-hidden="true">/</span><span>{cause.data.input.name}</span></>}
    </nav>
  );
  if (cause.isPending) return <>{crumbs}<LoadingShape says="Opening this cause" rows={8} rowClassName="h-14" /></>;
  if (cause.isError) return <>{crumbs}<ErrorState error={cause.error} onRetry={() => void cause.refetch()} /></>;
  const { data } = cause;
  return (
    <>
      <title>{`${data.fault.name} and ${data.levelLabel ?? data.input.name} – Loafmark`}</title>
      {crumbs}
      <CauseSentence cause={data} />
      <div className="mb-5 mt-4"><CountingSentence ask={counted} counted={data.generatedFrom} onAsk={(next) => setSearch(addressOfCounted(next, { level }))} /></div>
      <div className="grid items-start gap-x-9 gap-y-7 desk:grid-cols-[minmax(0,1.3fr)_minmax(0,1fr)]">
        <div className="grid min-w-0 gap-7">
          <DoseChart ask={ask} cause={data} />
          <BatchesBehind key={place} ask={ask} cause={data} batchLink={paths.batch} />
        </div>
        <div className="grid min-w-0 gap-7">
          <OddsRows cause={data} />
          <StrataTable cause={data} />
          <BeforeYouAct cause={data} />
        </div>
      </div>
    </>
  );
}
