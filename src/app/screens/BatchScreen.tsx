import { useQuery } from '@tanstack/react-query';
import { Camera, Copy, Pencil } from 'lucide-react';
import { useParams } from 'react-router-dom';
import type { AnyBatchView } from '#shared/batches.ts';
import { BlockLink } from '#src/components/Block.tsx';
import { Caution } from '#src/components/Caution.tsx';
import { Flag } from '#src/components/Flag.tsx';
import { LotTag } from '#src/components/LotTag.tsx';
import { Slice } from '#src/components/Slice.tsx';
import { ErrorState, LoadingShape } from '#src/components/states.tsx';
import { BatchLooks } from '#src/features/batches/BatchLooks.tsx';
import { BatchShelf } from '#src/features/batches/BatchShelf.tsx';
import { batchQuery } from '#src/features/batches/batches.queries.ts';
import { WhatWasFound } from '#src/features/batches/WhatWasFound.tsx';
import { WhatWentIn } from '#src/features/batches/WhatWentIn.tsx';
import { WhereBarsWent } from '#src/features/batches/WhereBarsWent.tsx';
import { PhotoStrip } from '#src/features/photos/PhotoStrip.tsx';
import { useMay } from '#src/features/session/session.queries.ts';
import { formatLongDay } from '#src/lib/format.ts';
import { METHOD_WORDS, STATE_WORDS } from '#src/lib/words.ts';
import { paths } from '../paths.ts';

/** One batch: from the making to now, what went in, what was found, where the bars went. */
export function Component() {
  const { batchId = '' } = useParams();
  const batch = useQuery(batchQuery(batchId));
  if (batch.isPending) return <LoadingShape says="Reading the batch" rows={5} rowClassName="h-24" />;
  if (batch.isError) return <><h1 className="mb-4">Batch</h1><ErrorState error={batch.error} onRetry={() => void batch.refetch()} /></>;
  const toLook = (stage: string) => paths.inspectBatch(batchId, stage);
  return (
    <>
      <title>{`${batch.data.code} – Loafmark`}</title>
      <BatchHead batch={batch.data} />
      {batch.data.holdReason && <div className="mt-4"><Caution>Held: {batch.data.holdReason}</Caution></div>}
      <div className="mt-6"><BatchShelf batch={batch.data} toLook={toLook} /></div>
      <div className="mt-8"><PhotoStrip batchId={batchId} batchCode={batch.data.code} /></div>
      <div className="mt-8 grid gap-x-9 gap-y-8 bench:grid-cols-2 desk:grid-cols-[1.15fr_1.2fr_0.9fr]">
        <WhatWentIn batch={batch.data} toLot={paths.lot} />
        <WhatWasFound batch={batch.data} />
        <div className="grid content-start gap-8">
          <WhereBarsWent batch={batch.data} />
          {batch.data.note && <section className="grid gap-2"><h2>Note</h2><p className="whitespace-pre-line text-row">{batch.data.note}</p></section>}
          <BatchLooks batchId={batchId} toLook={toLook} />
        </div>
      </div>
    </>
  );
}

function BatchHead({ batch }: { batch: AnyBatchView }) {
  const may = useMay();
  const scents = batch.ingredients.filter(({ kind, lotId }) => kind === 'fragrance' && lotId !== null);
  const facts = [
    batch.formulaName && `${batch.formulaName}${batch.formulaVersionNumber ? `, version ${batch.formulaVersionNumber}` : ''}`,
    METHOD_WORDS[batch.method],
    batch.mouldName,
    batch.bars && `${batch.bars} bars`,
  ].filter(Boolean);
  return (
    <div className="flex flex-wrap items-start gap-x-4 gap-y-3">
      <Slice soap={batch.palette} width={54} height={64} />
      <div className="grid min-w-0 flex-1 gap-1.5">
        <h1 className="stamp text-claim leading-none">{batch.code}</h1>
        <p className="flex flex-wrap items-center gap-x-4 gap-y-1 text-row">
          {facts.map((fact) => <span key={String(fact)}>{fact}</span>)}
          <span>made <b className="font-[640]">{formatLongDay(batch.madeOn)}</b>{batch.makerName && ` by ${batch.makerName}`}</span>
          {scents.map((line) => <LotTag key={line.id} code={line.lotCode ?? ''} standing={line.lotStanding ?? 'in-use'} to={paths.lot(line.lotId ?? '')} />)}
          <Flag kind={batch.holdReason ? 'held' : 'draft'}>{batch.holdReason ? 'held' : STATE_WORDS[batch.state]}</Flag>
        </p>
      </div>
      <div className="no-print flex flex-wrap gap-2 max-rack:w-full">
        {may('batch.write') && <BlockLink to={paths.changeBatch(batch.id)} className="max-rack:flex-1"><Pencil size={17} aria-hidden="true" />Change</BlockLink>}
        {may('batch.write') && <BlockLink to={paths.newBatch(batch.id)} className="max-rack:flex-1"><Copy size={17} aria-hidden="true" />Duplicate</BlockLink>}
        {may('inspection.write') && <BlockLink to={paths.inspectBatch(batch.id)} kind="main" className="max-rack:w-full"><Camera size={18} aria-hidden="true" />Look</BlockLink>}
        {!may('inspection.write') && <p className="max-w-56 text-note text-ink-2">You read this. Inspectors, makers and owners look; makers and owners change.</p>}
      </div>
    </div>
  );
}
