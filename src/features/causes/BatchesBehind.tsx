import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { BatchBehind, CauseDetail } from '#shared/causes.ts';
import { Choice } from '#src/components/Choice.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { SeverityNotches } from '#src/components/SeverityNotches.tsx';
import { ErrorState, LoadingShape } from '#src/components/states.tsx';
import { Strip, type Piece } from '#src/components/Strip.tsx';
import { formatCount, formatDay } from '#src/lib/format.ts';
import { METHOD_WORDS } from '#src/lib/words.ts';
import { measureWords } from './cause-words.ts';
import { behindQuery, type CauseAsk } from './causes.queries.ts';

const OUTCOME_WORDS: Record<BatchBehind['outcome'], string> = { found: 'found', clear: 'clear', 'not-checked': 'not looked at', 'not-yet': 'cannot be seen yet' };
const ORDER: readonly BatchBehind['outcome'][] = ['found', 'clear', 'not-checked', 'not-yet'];
const MOST_ROWS = 12;

/** Every batch behind the answer: a strip for each side, and the batches by name. */
export function BatchesBehind({ ask, cause, batchLink }: { ask: CauseAsk; cause: CauseDetail; batchLink: (id: string) => string }) {
  const behind = useQuery(behindQuery(ask));
  const [outcome, setOutcome] = useState<BatchBehind['outcome']>('found');
  const [isWhole, setWhole] = useState(false);
  if (behind.isPending) return <LoadingShape says="Reading the batches behind it" rows={4} />;
  if (behind.isError) return <ErrorState error={behind.error} onRetry={() => void behind.refetch()} />;
  const { items, total } = behind.data;
  const sides = cause.above === null
    ? [{ label: cause.levelLabel ?? 'With it', of: items.filter(({ group }) => group === 'exposed') }, { label: 'Others', of: items.filter(({ group }) => group === 'unexposed') }]
    : bandsOf(cause, items);
  const listed = items.filter((batch) => batch.outcome === outcome && batch.group !== null);
  const shown = isWhole ? listed : listed.slice(0, MOST_ROWS);
  return (
    <section>
      <Rail heading="The batches behind it" aside={total > items.length ? `the latest ${items.length} of ${total}` : 'height: severity. Low tick: not looked at'} />
      <div className="grid">
        {sides.map(({ label, of }) => {
          const found = of.filter((batch) => batch.outcome === 'found').length;
          const looked = of.filter((batch) => batch.outcome === 'found' || batch.outcome === 'clear').length;
          return (
            <div key={label} className="grid grid-cols-[8.5rem_minmax(0,1fr)_auto] items-center gap-x-3 border-b border-line py-2 text-row max-rack:grid-cols-[minmax(0,1fr)_auto]">
              <span>{label}</span>
              <span className="max-rack:order-last max-rack:col-span-2"><Strip pieces={piecesOf(of)} label={`${label}: ${found} of ${looked} found`} width={of.length > 60 ? 4 : of.length > 30 ? 7 : 11} height={20} gap={of.length > 60 ? 1 : 2} /></span>
              <span><b className="gauge text-gauge-s">{found}</b> of {looked}</span>
            </div>
          );
        })}
      </div>
      <div className="mt-3 overflow-x-auto"><Choice label="Which batches are listed" size="row" value={outcome} options={ORDER.map((value) => ({ value, label: `${OUTCOME_WORDS[value]} ${items.filter((batch) => batch.outcome === value && batch.group !== null).length}` }))} onChange={setOutcome} /></div>
      {listed.length === 0 ? <p className="py-3 text-row text-ink-2">No batch is {OUTCOME_WORDS[outcome]}.</p> : (
        <ul className="m-0 mt-1 list-none p-0">
          {shown.map((batch) => (
            <li key={batch.id} className="border-b border-line">
              <Link to={batchLink(batch.id)} className="grid grid-cols-[6rem_6.5rem_minmax(0,1fr)_auto] items-center gap-x-3 py-2 text-row no-underline hover:bg-tray coarse:py-3.5 max-rack:grid-cols-[5.5rem_minmax(0,1fr)_auto]">
                <span className="stamp text-note">{batch.code}</span>
                <span className="text-ink-2">{formatDay(batch.madeOn)}</span>
                <span className="max-rack:hidden">{METHOD_WORDS[batch.method]}, {batch.group === 'exposed' ? sides[0]?.label && cause.above === null ? 'with it' : 'above the middle' : cause.above === null ? 'without it' : 'below the middle'}{batch.value !== null && `, ${measureWords(batch.value, cause.input.unit)}`}</span>
                {batch.severity !== null && batch.severity > 0 ? <SeverityNotches severity={batch.severity} /> : <span />}
              </Link>
            </li>
          ))}
        </ul>
      )}
      {listed.length > shown.length && <button type="button" className="mt-2 min-h-10 text-row font-[560] underline coarse:min-h-12" onClick={() => setWhole(true)}>Show all {formatCount(listed.length, 'batch', 'batches')}</button>}
    </section>
  );
}

function piecesOf(batches: readonly BatchBehind[]): Piece[] {
  return [...batches].sort((a, b) => ORDER.indexOf(a.outcome) - ORDER.indexOf(b.outcome) || (b.severity ?? 0) - (a.severity ?? 0))
    .map(({ outcome, severity }): Piece => (outcome === 'found' ? { kind: 'found', severity: severity ?? 1 } : { kind: outcome }));
}

/** The bands of a number; what was not looked at stands in the band its value lies in. */
function bandsOf(cause: CauseDetail, items: readonly BatchBehind[]): { label: string; of: BatchBehind[] }[] {
  if (cause.bins.length === 0) return [{ label: 'All', of: items.filter(({ value }) => value !== null) }];
  return cause.bins.map((bin, at) => {
    const next = cause.bins[at + 1];
    const inside = (value: number) => (at === 0 || value >= bin.from) && (next === undefined || value < next.from);
    const label = at === 0 ? `up to ${measureWords(bin.to, cause.input.unit)}` : next === undefined ? `from ${measureWords(bin.from, cause.input.unit)}` : `${measureWords(bin.from, '')} to ${measureWords(bin.to, cause.input.unit)}`;
    return { label, of: items.filter(({ value }) => value !== null && inside(value)) };
  });
}
