import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useCallback, useMemo } from 'react';
import { Link, useLocation, useSearchParams } from 'react-router-dom';
import type { CauseCell, CausesBoard } from '#shared/causes.ts';
import { BlockLink } from '#src/components/Block.tsx';
import { EmptyState, ErrorState, LoadingShape } from '#src/components/states.tsx';
import { TabLinks } from '#src/components/TabLinks.tsx';
import { boardColumns } from '#src/features/causes/board-columns.ts';
import { BoardGrid } from '#src/features/causes/BoardGrid.tsx';
import { BoardList } from '#src/features/causes/BoardList.tsx';
import { BoardNotes } from '#src/features/causes/BoardNotes.tsx';
import { boardNames } from '#src/features/causes/cause-words.ts';
import { boardQuery, type CountedAsk } from '#src/features/causes/causes.queries.ts';
import { addressOfCounted, countedFromAddress } from '#src/features/causes/counted-address.ts';
import { CountingSentence } from '#src/features/causes/CountingSentence.tsx';
import { standingCells } from '#src/features/causes/standing-cells.ts';
import { StandingSentences } from '#src/features/causes/StandingSentences.tsx';
import { WireKey } from '#src/features/causes/WireKey.tsx';
import { useNarrow } from '#src/lib/use-narrow.ts';
import { paths } from '../paths.ts';

/** What goes with what: sentences that stand, then the board they were read from. */
export function Component() {
  const [search, setSearch] = useSearchParams();
  const isNarrow = useNarrow();
  const ask = useMemo(() => countedFromAddress(search), [search]);
  const view = search.get('view') ?? (isNarrow ? 'list' : 'board');
  const all = search.get('columns') === 'all';
  const board = useQuery({ ...boardQuery(ask), placeholderData: keepPreviousData });
  const setAsk = (next: CountedAsk) => setSearch(addressOfCounted(next, { view: search.get('view'), columns: search.get('columns') }));
  const tab = (key: string) => `${paths.causes}${addressOfCounted(ask, { view: key, columns: search.get('columns') })}`;
  return (
    <>
      <title>Causes – Loafmark</title>
      <div className="mb-3 flex flex-wrap items-center gap-x-6 gap-y-2.5">
        <h1>What goes with what</h1>
        <TabLinks label="Shown as" current={view} tabs={[{ key: 'board', label: 'Board', to: tab('board') }, { key: 'list', label: 'List', to: tab('list') }]} />
      </div>
      {board.isPending ? (
        <LoadingShape says="Working out what goes with what. A large log takes some seconds." rows={10} rowClassName="h-12" />
      ) : board.isError && !board.data ? (
        <ErrorState error={board.error} onRetry={() => void board.refetch()} />
      ) : (
        <Answer board={board.data} ask={ask} setAsk={setAsk} view={view} all={all} isOld={board.isPlaceholderData} />
      )}
    </>
  );
}

interface AnswerProps { board: CausesBoard; ask: CountedAsk; setAsk: (ask: CountedAsk) => void; view: string; all: boolean; isOld: boolean }

function Answer({ board, ask, setAsk, view, all, isOld }: AnswerProps) {
  const location = useLocation();
  const names = useMemo(() => boardNames(board), [board]);
  const { columns, total } = useMemo(() => boardColumns(board, names, all), [board, names, all]);
  const standing = useMemo(() => standingCells(board.cells), [board]);
  const faults = useMemo(() => board.faults.filter((fault) => all || fault.found > 0), [board, all]);
  const linkOf = useCallback((cell: CauseCell) => {
    const level = cell.level === null ? undefined : cell.level;
    return `/causes/${cell.fault}/${cell.input}${addressOfCounted(ask, { level })}`;
  }, [ask]);
  const looked = board.faults.some((fault) => fault.checked > 0);
  const startAt = typeof location.state === 'string' ? location.state : undefined;
  return (
    <div aria-busy={isOld || undefined}>
      <div className="grid items-start gap-x-9 gap-y-5 desk:grid-cols-[minmax(0,1fr)_23.5rem]">
        {standing.length > 0 ? <StandingSentences cells={standing} names={names} linkOf={linkOf} /> : (
          <EmptyState title={looked ? 'Nothing stands yet' : 'Nothing was looked at yet'} act={<BlockLink to={paths.inspect} kind="main">Look at a batch</BlockLink>}>
            {looked ? 'What was found so far may all be chance. Each wire below says how many batches are behind it.' : 'Once batches are looked at, this page says what goes with each fault, and how sure that is.'}
          </EmptyState>
        )}
        <WireKey />
      </div>
      <div className="mb-3 mt-6"><CountingSentence ask={ask} counted={board.generatedFrom} onAsk={setAsk} /></div>
      {!looked ? null : view === 'list' ? <BoardList cells={board.cells} faults={faults} names={names} linkOf={linkOf} /> : (
        <>
          <BoardGrid board={board} faults={faults} columns={columns} names={names} linkOf={linkOf} startAt={startAt} />
          <p className="mt-2 text-note text-ink-2">
            {all ? `All ${total} columns and ${faults.length} faults. ` : `The ${columns.length} columns that say most, of ${total}; faults that were found. `}
            <Link to={`${paths.causes}${addressOfCounted(ask, { view, columns: all ? null : 'all' })}`} preventScrollReset className="font-[560] coarse:py-3">{all ? 'Show what says most' : 'Show all of them'}</Link>
          </p>
        </>
      )}
      {looked && <BoardNotes board={board} names={names} />}
    </div>
  );
}
