import { useQuery } from '@tanstack/react-query';
import { Rail } from '#src/components/Rail.tsx';
import { EmptyState, ErrorState, LoadingShape } from '#src/components/states.tsx';
import { faultsQuery } from '#src/features/faults/faults.queries.ts';
import { DueList } from '#src/features/inspections/DueList.tsx';
import { dueQuery } from '#src/features/inspections/inspections.queries.ts';
import { BlockLink } from '#src/components/Block.tsx';
import { formatCount } from '#src/lib/format.ts';
import { paths } from '../paths.ts';

/** What wants looking at, all of it. */
export function Component() {
  const due = useQuery(dueQuery);
  const faults = useQuery(faultsQuery);
  const faultName = (slug: string) => faults.data?.find((fault) => fault.slug === slug)?.name ?? slug;
  const now = due.data?.filter(({ standing }) => standing !== 'coming') ?? [];
  const coming = due.data?.filter(({ standing }) => standing === 'coming') ?? [];
  return (
    <div className="grid grid-cols-1 gap-8">
      <h1>Inspect</h1>
      {due.isPending && <LoadingShape says="Counting the looks that are due" rowClassName="h-14" />}
      {due.isError && <ErrorState error={due.error} onRetry={() => void due.refetch()} />}
      {due.data && (
        <>
          <section>
            <Rail heading="Look at these" aside={formatCount(now.length, 'look')} />
            {now.length > 0 ? <DueList items={now} faultName={faultName} addressOf={(look) => paths.inspectBatch(look.batchId, look.stage)} /> : <EmptyState title="Nothing is due today" act={<BlockLink to={paths.batches}>Choose a batch from the log</BlockLink>} />}
          </section>
          {coming.length > 0 && (
            <section>
              <Rail heading="Coming" aside={formatCount(coming.length, 'look')} />
              <DueList items={coming.slice(0, 12)} faultName={faultName} addressOf={(look) => paths.inspectBatch(look.batchId, look.stage)} />
            </section>
          )}
        </>
      )}
    </div>
  );
}
