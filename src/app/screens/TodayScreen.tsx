import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { BlockLink } from '#src/components/Block.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { Slice } from '#src/components/Slice.tsx';
import { EmptyState, ErrorState, LoadingShape } from '#src/components/states.tsx';
import { batchesQuery } from '#src/features/batches/batches.queries.ts';
import { faultsQuery } from '#src/features/faults/faults.queries.ts';
import { DueList } from '#src/features/inspections/DueList.tsx';
import { dueQuery } from '#src/features/inspections/inspections.queries.ts';
import { UploadList } from '#src/features/photos/UploadList.tsx';
import { useUploads } from '#src/features/photos/Uploads.tsx';
import { useMay, useSession } from '#src/features/session/session.queries.ts';
import { OnTheWay } from '#src/features/today/OnTheWay.tsx';
import { formatCount, formatLongDay, todayIn } from '#src/lib/format.ts';
import { METHOD_WORDS, STATE_WORDS } from '#src/lib/words.ts';
import { paths } from '../paths.ts';

/** States of a loaf that is not sold yet. */
const ON_THE_WAY = ['in-mould', 'curing', 'cured'] as const;
const SHOWN = 8;

/** What needs doing now. */
export function Component() {
  const { workshop } = useSession();
  const may = useMay();
  const today = todayIn(workshop.timeZone);
  const due = useQuery(dueQuery);
  const faults = useQuery(faultsQuery);
  const way = useInfiniteQuery(batchesQuery({ state: [...ON_THE_WAY] }));
  const making = useInfiniteQuery(batchesQuery({ state: ['making', 'planned'] }));
  const loaves = way.data?.pages[0]?.items ?? [];
  const open = making.data?.pages[0]?.items ?? [];
  const now = due.data?.filter(({ standing }) => standing !== 'coming') ?? [];
  const late = now.filter(({ daysLate, standing }) => daysLate > 0 && standing !== 'due').length;
  const faultName = (slug: string) => faults.data?.find((fault) => fault.slug === slug)?.name ?? slug;
  const unsent = useUploads().uploads;
  const failed = [due, way, making].find((query) => query.isError);
  const isEmpty = way.isSuccess && making.isSuccess && loaves.length === 0 && open.length === 0;
  return (
    <div className="grid grid-cols-1 gap-8">
      <div className="flex flex-wrap items-end justify-between gap-4">
        <div>
          <p className="text-row text-ink-2">{formatLongDay(today)}, {workshop.name}</p>
          <h1 className="say max-w-3xl text-say max-rack:text-[1.4375rem]">
            {due.isPending ? 'Counting what is due' : now.length === 0 ? 'Nothing wants looking at today.' : <><b className="font-[720]">{formatCount(now.length, 'look')}</b> {now.length === 1 ? 'is' : 'are'} due{late > 0 && <>, <b className="font-[720]">{late} of them late</b></>}.</>}
          </h1>
        </div>
        {may('batch.write') && <BlockLink to={paths.newBatch()} kind="main">Log a batch</BlockLink>}
      </div>
      {failed && <ErrorState error={failed.error} onRetry={() => void failed.refetch()} />}
      {isEmpty ? (
        <EmptyState title="No batch is on the way" act={may('batch.write') && <div className="flex flex-wrap gap-2"><BlockLink to={paths.newBatch()} kind="main">Log the first batch</BlockLink><BlockLink to={paths.imports}>Import a batch history</BlockLink></div>}>
          Log a batch, photograph it, mark what you see. After eight checked batches or so, Causes begins to answer.
        </EmptyState>
      ) : way.isPending ? <LoadingShape says="Setting the loaves on their shelf" rows={2} rowClassName="h-16" /> : <OnTheWay batches={loaves} due={due.data ?? []} today={today} batchAddress={paths.batch} />}
      <div className="grid grid-cols-1 gap-9 bench:grid-cols-[minmax(0,1.7fr)_minmax(0,1fr)]">
        <section>
          <Rail heading="Look at these" aside={due.data && (now.length > SHOWN ? `${SHOWN} of ${now.length}` : formatCount(now.length, 'look'))} />
          {due.isPending ? <LoadingShape says="Counting the looks that are due" rowClassName="h-14" /> : now.length === 0 ? <EmptyState title="Nothing is due" /> : <DueList items={now.slice(0, SHOWN)} faultName={faultName} addressOf={(look) => paths.inspectBatch(look.batchId, look.stage)} />}
          {now.length > SHOWN && <BlockLink to={paths.inspect} kind="quiet" className="mt-3">All {now.length}</BlockLink>}
        </section>
        <section>
          {unsent.length > 0 && <div className="mb-8"><Rail heading="Photos on their way" aside={formatCount(unsent.length, 'photo')} /><UploadList uploads={unsent} withBatch /></div>}
          <Rail heading="On the bench" aside={formatCount(open.length, 'batch', 'batches')} />
          {open.length === 0 ? <EmptyState title="Nothing planned or in the making" /> : (
            <ul>
              {open.map((batch) => (
                <li key={batch.id} className="flex min-h-14 items-center gap-3 border-b border-line">
                  <Slice soap={batch.palette} />
                  <span className="min-w-0 flex-1"><span className="stamp text-row">{batch.code}</span><br /><span className="text-note text-ink-2">{[STATE_WORDS[batch.state], METHOD_WORDS[batch.method], batch.formulaName].filter(Boolean).join(', ')}</span></span>
                  <BlockLink to={paths.batch(batch.id)}>Open</BlockLink>
                </li>
              ))}
            </ul>
          )}
        </section>
      </div>
    </div>
  );
}
