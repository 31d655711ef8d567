import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { Rail } from '#src/components/Rail.tsx';
import { EmptyState, ErrorState, LoadingShape } from '#src/components/states.tsx';
import { addressOfCounted, countedFromAddress } from '#src/features/causes/counted-address.ts';
import { CountingSentence } from '#src/features/causes/CountingSentence.tsx';
import { ComparisonRows } from '#src/features/methods/ComparisonRows.tsx';
import { methodComparisonQuery } from '#src/features/methods/methods.queries.ts';
import { formatCount } from '#src/lib/format.ts';
import { paths } from '../paths.ts';

/** Hot and cold side by side, never one score; where they never met is said as loudly as where they differ. */
export function Component() {
  const [search, setSearch] = useSearchParams();
  const { family: _family, ...ask } = useMemo(() => countedFromAddress(search), [search]);
  const answer = useQuery({ ...methodComparisonQuery(ask), placeholderData: keepPreviousData });
  if (answer.isPending) return <LoadingShape says="Comparing hot and cold" rows={10} rowClassName="h-12" />;
  if (answer.isError && !answer.data) return <ErrorState error={answer.error} onRetry={() => void answer.refetch()} />;
  const { faults, batches, onlyIn, generatedFrom } = answer.data;
  const shown = faults.filter((fault) => fault.hot.events + fault.cold.events > 0);
  const sure = shown.filter((fault) => (fault.grade === 'settled' || fault.grade === 'likely') && fault.cell);
  const named = (direction: 'more' | 'less') => sure.filter((fault) => fault.cell?.direction === direction).map((fault) => fault.name.toLowerCase()).join(', ');
  return (
    <>
      <title>Hot and cold – Loafmark</title>
      <h1 className="mb-2">{sure.length === 0 ? 'No fault is sure to go with hot or cold yet' : [named('more') && `With hot: ${named('more')}`, named('less') && `with cold: ${named('less')}`].filter(Boolean).join('; ')}</h1>
      <p className="say mb-4 text-bench text-ink-2">{formatCount(batches.cold, 'cold batch', 'cold batches')} (open bars), {formatCount(batches.hot, 'hot batch', 'hot batches')} (banded bars). Neither is better in all.</p>
      <CountingSentence ask={ask} counted={generatedFrom} onAsk={(next) => setSearch(addressOfCounted(next))} hasFamily={false} />
      <div className="mt-4">{shown.length === 0 ? <EmptyState title="Nothing to compare yet">Once faults were looked for in hot and in cold batches, both stand here.</EmptyState> : <ComparisonRows faults={shown} causeLink={(fault) => paths.cause(fault, 'methodFamily')} />}</div>
      <section className="mt-8">
        <Rail heading="Where they never met" />
        {onlyIn.length === 0 ? <p className="pt-2 text-ink-2">Every lot, formula and maker with five batches was in both.</p> : <ul className="m-0 list-none p-0 text-row">{onlyIn.map((one) => <li key={one.level} className="border-b border-line py-2"><b>{one.detail ? `${one.detail} ${one.label}` : one.label}</b> was made {one.family} only, {formatCount(one.batches, 'batch', 'batches')}. Nothing can be said about it in {one.family === 'hot' ? 'cold' : 'hot'}.</li>)}</ul>}
      </section>
    </>
  );
}
