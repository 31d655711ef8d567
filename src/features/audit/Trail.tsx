import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { Block } from '#src/components/Block.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { EmptyState, ErrorState, LoadingShape } from '#src/components/states.tsx';
import { SelectField } from '#src/components/TextField.tsx';
import { membersQuery } from '#src/features/members/members.queries.ts';
import { useSession } from '#src/features/session/session.queries.ts';
import { formatCount } from '#src/lib/format.ts';
import { trailQuery } from './audit.queries.ts';
import { TrailEntry } from './TrailEntry.tsx';
import { TABLE_OPTIONS } from './trail-words.ts';

/** Who changed what, when, before and after; the filter is in the address. */
export function Trail() {
  const [search, setSearch] = useSearchParams();
  const { workshop } = useSession();
  const people = useQuery(membersQuery).data ?? [];
  const filter = { memberId: search.get('who') ?? undefined, table: search.get('what') ?? undefined, recordId: search.get('record') ?? undefined };
  const trail = useInfiniteQuery(trailQuery(filter));
  const entries = trail.data?.pages.flatMap(({ items }) => items) ?? [];
  const set = (name: string, value: string | null) => setSearch((current) => {
    if (value) current.set(name, value);
    else current.delete(name);
    return current;
  }, { replace: true });
  return (
    <section className="grid gap-4">
      <Rail heading="Trail" aside={trail.isSuccess && `${formatCount(entries.length, 'entry', 'entries')}${trail.hasNextPage ? ' and more' : ''}`} />
      <div className="grid gap-4 rack:grid-cols-[16rem_16rem_auto] rack:items-end">
        <SelectField label="Who" emptyLabel="everybody" value={filter.memberId ?? ''} options={people.map(({ id, name }) => ({ value: id, label: name }))} onChange={(event) => set('who', event.target.value)} />
        <SelectField label="What" emptyLabel="everything" value={filter.table ?? ''} options={TABLE_OPTIONS} onChange={(event) => set('what', event.target.value)} />
        {filter.recordId && <Block kind="quiet" className="justify-self-start" onClick={() => set('record', null)}>All records, not this one alone</Block>}
      </div>
      {trail.isPending && <LoadingShape says="Reading the trail" rows={8} rowClassName="h-14" />}
      {trail.isError && entries.length === 0 && <ErrorState error={trail.error} onRetry={() => void trail.refetch()} />}
      {trail.isSuccess && entries.length === 0 && <EmptyState title="Nothing of this kind was changed yet.">Every change of a record leaves who, when, before and after here.</EmptyState>}
      <ol>
        {entries.map((entry) => <TrailEntry key={entry.id} entry={entry} timeZone={workshop.timeZone} onRecord={(recordId) => set('record', recordId)} />)}
      </ol>
      {trail.hasNextPage && <Block className="justify-self-start" busy={trail.isFetchingNextPage && 'Reading …'} onClick={() => void trail.fetchNextPage()}>Earlier entries</Block>}
    </section>
  );
}
