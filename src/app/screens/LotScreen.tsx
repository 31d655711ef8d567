import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { LotTag, STANDING_WORDS } from '#src/components/LotTag.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { ErrorState, LoadingShape, NotAllowed } from '#src/components/states.tsx';
import { LotAgainstPeers, LotStrips } from '#src/features/lots/LotRates.tsx';
import { lotBehaviourQuery, lotQuery, standingChangesQuery } from '#src/features/lots/lots.queries.ts';
import { StandingForm } from '#src/features/lots/StandingForm.tsx';
import { VERDICT_SETTING, VERDICT_WORDS } from '#src/features/lots/verdict-words.ts';
import { useMay } from '#src/features/session/session.queries.ts';
import { formatDay, formatInstant, formatPercent } from '#src/lib/format.ts';
import { paths } from '../paths.ts';

/** One lot: how it stands, how it behaves in cold and in hot, and every batch that holds it. */
export function Component() {
  const { lotId = '' } = useParams();
  const may = useMay();
  const lot = useQuery(lotQuery(lotId));
  const behaviour = useQuery(lotBehaviourQuery(lotId));
  const changes = useQuery(standingChangesQuery(lotId));
  if (lot.isPending) return <LoadingShape says="Reading the lot" rows={6} rowClassName="h-14" />;
  if (lot.isError) return <ErrorState error={lot.error} onRetry={() => void lot.refetch()} />;
  const { data } = lot;
  const facts: [string, string | null][] = [
    ['received', data.receivedOn && formatDay(data.receivedOn)], ['opened', data.openedOn && formatDay(data.openedOn)], ['best before', data.bestBeforeOn && formatDay(data.bestBeforeOn)],
    ['left', data.quantityLeftG === null ? null : `${data.quantityLeftG} g of ${data.quantityG ?? 'unknown'} g`], ['flash point', data.flashPointC === null ? null : `${data.flashPointC} °C`],
    ['rinse-off maximum', data.certificateMaxFraction === null ? 'not known' : formatPercent(data.certificateMaxFraction)], ['vanillin', data.vanillinFraction === null ? null : formatPercent(data.vanillinFraction)],
    ['purity', data.purityFraction === null ? null : formatPercent(data.purityFraction)], ['storage', data.storage], ['note', data.note],
  ];
  return (
    <>
      <title>{`Lot ${data.code} – Loafmark`}</title>
      <nav aria-label="Where this is" className="mb-2 text-row"><Link to={paths.lots} className="font-[560]">Lots</Link></nav>
      <div className="flex flex-wrap items-center gap-4"><LotTag code={data.code} standing={data.standing} isLarge /><h1>{data.materialName}{data.supplierName && `, ${data.supplierName}`}</h1></div>
      <dl className="m-0 mt-3 flex flex-wrap gap-x-5 gap-y-1 text-row">{facts.map(([word, value]) => value !== null && <div key={word} className="flex gap-1.5"><dt>{word}</dt><dd className="m-0 font-[640]">{value}</dd></div>)}</dl>
      {behaviour.isPending ? <LoadingShape says="Comparing it with its peers" rows={4} /> : behaviour.isError ? <ErrorState error={behaviour.error} onRetry={() => void behaviour.refetch()} /> : (
        <>
          <p className="say mb-4 mt-6 text-say"><span className={VERDICT_SETTING[behaviour.data.verdict]}>{VERDICT_WORDS[behaviour.data.verdict]}</span>{behaviour.data.suggestedStanding && <>: its batches speak for {STANDING_WORDS[behaviour.data.suggestedStanding]}. {behaviour.data.because.map((one) => `${one.coldEvents} of ${one.coldN} cold, ${one.hotEvents} of ${one.hotN} hot${one.hotUpper === null ? '' : ` (which still allows up to ${Math.round(one.hotUpper * 100)} in 100)`}`)[0]}.</>}</p>
          <LotStrips behaviour={behaviour.data} />
        </>
      )}
      <div className="mt-7 grid items-start gap-x-9 gap-y-7 desk:grid-cols-[minmax(0,1.3fr)_minmax(0,1fr)]">
        <div className="grid min-w-0 gap-7">
          {behaviour.data && <LotAgainstPeers behaviour={behaviour.data} />}
          {behaviour.data && behaviour.data.batches.length > 0 && (
            <section>
              <Rail heading="Its batches" aside={behaviour.data.batches.length} />
              <ul className="m-0 list-none p-0">
                {[...behaviour.data.batches].reverse().map((batch) => (
                  <li key={batch.id} className="border-b border-line"><Link to={paths.batch(batch.id)} className="grid grid-cols-[6rem_7rem_3rem_minmax(0,1fr)] gap-x-3 py-2 text-row no-underline hover:bg-tray coarse:py-3.5 max-rack:grid-cols-[5.5rem_minmax(0,1fr)]"><span className="stamp text-note">{batch.code}</span><span className="text-ink-2">{formatDay(batch.madeOn)}</span><span>{batch.family}</span><span>{batch.found.length > 0 ? batch.found.map(({ fault }) => fault.replaceAll('-', ' ')).join(', ') : batch.clear.length > 0 ? 'clear where looked at' : 'not looked at'}</span></Link></li>
                ))}
              </ul>
            </section>
          )}
        </div>
        <section>
          <Rail heading="Standing" />
          <p className="mt-3 inline-block border-3 border-ink bg-tray px-3 py-2"><span className="set-settled text-gauge-s">{STANDING_WORDS[data.standing]}</span></p>
          {may('lot.hold') ? <StandingForm key={data.version} lot={data} suggested={behaviour.data?.suggestedStanding ?? null} /> : <div className="mt-3"><NotAllowed>An owner, a maker or an inspector changes the standing.</NotAllowed></div>}
          {changes.data && changes.data.length > 0 && <ol className="m-0 mt-4 list-none p-0 text-row">{changes.data.map((change) => <li key={change.id} className="border-b border-line py-2"><b>{STANDING_WORDS[change.after]}</b>, was {STANDING_WORDS[change.before]}. {change.reason} <span className="text-ink-2">{change.memberName ?? 'somebody'}, {formatInstant(change.changedAt)}</span></li>)}</ol>}
        </section>
      </div>
    </>
  );
}
