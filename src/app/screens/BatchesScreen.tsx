import { keepPreviousData, useInfiniteQuery } from '@tanstack/react-query';
import { Download } from 'lucide-react';
import { useCallback, useMemo, useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { Block, BlockLink } from '#src/components/Block.tsx';
import { Choice } from '#src/components/Choice.tsx';
import { EmptyState, ErrorState, LoadingShape } from '#src/components/states.tsx';
import { batchesCsvAddress, batchesQuery, type BatchesAsk } from '#src/features/batches/batches.queries.ts';
import { addressOfAsk, askFromAddress, isNarrowed } from '#src/features/batches/filter-address.ts';
import { LogCount } from '#src/features/batches/LogCount.tsx';
import { LogFaces, LogRows } from '#src/features/batches/LogRows.tsx';
import { LogSentence } from '#src/features/batches/LogSentence.tsx';
import { LogTable } from '#src/features/batches/LogTable.tsx';
import { SelectedBatches } from '#src/features/batches/SelectedBatches.tsx';
import { useMay, useSession } from '#src/features/session/session.queries.ts';
import { todayIn } from '#src/lib/format.ts';
import { paths } from '../paths.ts';

const LINKS = { batch: paths.batch, lot: paths.lot };

/** The log: every batch, narrowed by a sentence that is also its address. */
export function Component() {
  const [search, setSearch] = useSearchParams();
  const navigate = useNavigate();
  const may = useMay();
  const { workshop } = useSession();
  const ask = useMemo(() => askFromAddress(search), [search]);
  const view = search.get('view') === 'faces' ? 'faces' : 'rows';
  const [selected, setSelected] = useState<ReadonlySet<string>>(new Set());
  const log = useInfiniteQuery({ ...batchesQuery(ask), placeholderData: keepPreviousData });
  const rows = useMemo(() => log.data?.pages.flatMap((page) => page.items) ?? [], [log.data]);
  const currentYear = Number(todayIn(workshop.timeZone).slice(0, 4));

  const go = useCallback((next: BatchesAsk, nextView: string) => {
    const address = addressOfAsk(next);
    if (nextView === 'faces') address.set('view', 'faces');
    // At once: a second press must not start from the filter before the first.
    setSearch(address, { flushSync: true });
  }, [setSearch]);
  const setAsk = useCallback((next: BatchesAsk) => go(next, view), [go, view]);
  const toggle = useCallback((id: string) => setSelected((before) => {
    const after = new Set(before);
    if (!after.delete(id)) after.add(id);
    return after;
  }), []);

  return (
    <>
      <title>Batches – Loafmark</title>
      <div className="flex items-start gap-4 max-rack:flex-wrap">
        <div className="min-w-0 flex-1">
          <h1 className="sr-only">Batches</h1>
          <LogSentence ask={ask} onAsk={setAsk} />
        </div>
        {may('batch.write') && <BlockLink to={paths.newBatch()} kind="main" className="max-rack:w-full">Log a batch</BlockLink>}
      </div>
      <div className="mb-2.5 mt-3.5 flex flex-wrap items-center gap-x-3.5 gap-y-2">
        <LogCount ask={ask} onAsk={setAsk} />
        <div className="ml-auto flex items-center gap-2">
          <Choice label="Shown as" value={view} options={[{ value: 'rows', label: 'Rows' }, { value: 'faces', label: 'Faces' }]} onChange={(next) => go(ask, next)} />
          <a href={batchesCsvAddress(ask)} download="batches.csv" className="block-edge inline-flex min-h-10 items-center gap-2 rounded-bar bg-lift px-4 font-[580] no-underline coarse:min-h-12"><Download size={18} aria-hidden="true" />CSV</a>
        </div>
      </div>
      {log.isPending ? (
        <LoadingShape says="Reading the log" rows={12} />
      ) : log.isError && rows.length === 0 ? (
        <ErrorState error={log.error} onRetry={() => void log.refetch()} />
      ) : rows.length === 0 ? (
        <NoBatches isNarrowed={isNarrowed(ask)} mayWrite={may('batch.write')} onAll={() => setAsk({})} />
      ) : (
        <>
          {view === 'faces' ? (
            <LogFaces rows={rows} currentYear={currentYear} links={LINKS} />
          ) : (
            <>
              <div className="max-rack:hidden">
                <LogTable rows={rows} ask={ask} onAsk={setAsk} links={LINKS} onOpen={(id) => void navigate(paths.batch(id))} selected={selected} onSelect={toggle} currentYear={currentYear} />
              </div>
              <div className="rack:hidden"><LogRows rows={rows} currentYear={currentYear} links={LINKS} /></div>
            </>
          )}
          {log.hasNextPage && <Block className="mt-4 max-rack:w-full" busy={log.isFetchingNextPage && 'Reading on …'} onClick={() => void log.fetchNextPage()}>Show more</Block>}
          {log.isFetchNextPageError && <div className="mt-3"><ErrorState error={log.error} onRetry={() => void log.fetchNextPage()} /></div>}
          {view === 'rows' && <LogKey />}
        </>
      )}
      <SelectedBatches rows={rows.filter(({ id }) => selected.has(id))} onClear={() => setSelected(new Set())} />
    </>
  );
}

function NoBatches({ isNarrowed: narrowed, mayWrite, onAll }: { isNarrowed: boolean; mayWrite: boolean; onAll: () => void }) {
  if (narrowed) return <EmptyState title="No batch fits this sentence" act={<Block onClick={onAll}>Show all batches</Block>}>Take a part out of it, or choose more days.</EmptyState>;
  return (
    <EmptyState title="No batch is logged yet" act={mayWrite ? <span className="flex flex-wrap gap-2"><BlockLink to={paths.newBatch()} kind="main">Log the first batch</BlockLink><BlockLink to={paths.imports}>Bring in a sheet</BlockLink></span> : undefined}>
      {mayWrite ? 'Log the batch on the bench, or bring in what stands in a spreadsheet.' : 'An owner or a maker logs batches; they show here at once.'}
    </EmptyState>
  );
}

function LogKey() {
  return (
    <p className="mt-2.5 text-note text-ink-2 max-rack:hidden">
      Looked at: one piece per fault of the stages done; filled found, open clear, low tick not looked at. Bars: solid firsts, half seconds, crossed embeds, layered rebatch, X discarded, dot kept, low bar on the rack.
      {' '}Keys: <b>J</b> <b>K</b> move, <b>Enter</b> opens, <b>X</b> selects, <b>/</b> finds.
    </p>
  );
}
