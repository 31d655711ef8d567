import { useSuspenseQuery } from '@tanstack/react-query';
import { Suspense } from 'react';
import { Link, useParams, useSearchParams } from 'react-router-dom';
import { STAGES, Stage } from '#shared/words/stages.ts';
import { Slice } from '#src/components/Slice.tsx';
import { LoadingShape } from '#src/components/states.tsx';
import { SelectField } from '#src/components/TextField.tsx';
import { batchQuery } from '#src/features/batches/batches.queries.ts';
import { LookAtBatch } from '#src/features/inspections/LookAtBatch.tsx';
import { dueQuery } from '#src/features/inspections/inspections.queries.ts';
import { PhotoAdder } from '#src/features/photos/PhotoAdder.tsx';
import { formatDay } from '#src/lib/format.ts';
import { METHOD_WORDS, optionsOf, STAGE_WORDS } from '#src/lib/words.ts';
import { paths } from '../paths.ts';

/** Inspect and mark one batch at one stage; the stage is in the address. */
export function Component() {
  const { batchId = '' } = useParams();
  return (
    <Suspense fallback={<LoadingShape says="Fetching the batch and its photos" rows={5} rowClassName="h-20" />}>
      <Look batchId={batchId} />
    </Suspense>
  );
}

function Look({ batchId }: { batchId: string }) {
  const [search, setSearch] = useSearchParams();
  const { data: batch } = useSuspenseQuery(batchQuery(batchId));
  const { data: due } = useSuspenseQuery(dueQuery);
  const asked = Stage.safeParse(search.get('stage'));
  const stage = asked.success ? asked.data : (due.find((look) => look.batchId === batchId)?.stage ?? 'cut');
  return (
    <div className="grid grid-cols-1 gap-4">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
        <h1 className="flex items-center gap-2.5"><Slice soap={batch.palette} /><Link to={paths.batch(batchId)} className="stamp text-[1.1875rem] no-underline">{batch.code}</Link></h1>
        <p className="text-note text-ink-2">{[batch.formulaName, METHOD_WORDS[batch.method], `made ${formatDay(batch.madeOn)}`, batch.makerName].filter(Boolean).join(', ')}</p>
        <SelectField label="Stage" className="ml-auto grid-flow-col items-center gap-2 max-rack:ml-0" value={stage} options={optionsOf(STAGES, STAGE_WORDS)} onChange={(event) => setSearch({ stage: event.target.value }, { replace: true })} />
      </div>
      {batch.holdReason && <p role="alert" className="bg-safe-fill px-3.5 py-2.5 font-[560] text-on-safe">Held: {batch.holdReason}</p>}
      <LookAtBatch key={stage} batch={batch} stage={stage} photoAdder={<PhotoAdder batchId={batch.id} batchCode={batch.code} stage={stage} />} />
    </div>
  );
}
