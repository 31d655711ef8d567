import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { AnyBatchView } from '#shared/batches.ts';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { ErrorState, LoadingShape } from '#src/components/states.tsx';
import { inspectionsOfBatchQuery } from '#src/features/inspections/inspections.queries.ts';
import { photosOfBatchQuery, pictureAddress } from '#src/features/photos/photos.queries.ts';
import { useSession } from '#src/features/session/session.queries.ts';
import { formatDay } from '#src/lib/format.ts';
import { showQuantity } from '#src/lib/units.ts';
import { STAGE_WORDS, TRACE_WORDS } from '#src/lib/words.ts';
import { clockIn } from '#src/lib/zoned.ts';
import { useFaultName } from './FaultMarks.tsx';
import { stageShelf, type ShelfPlace } from './stage-shelf.ts';

/** The batch from its making to now on one shelf: a picture over each stage, what was seen under it. */
export function BatchShelf({ batch, toLook }: { batch: AnyBatchView; toLook: (stage: string) => string }) {
  const inspections = useQuery(inspectionsOfBatchQuery(batch.id));
  const photos = useQuery(photosOfBatchQuery(batch.id));
  if (inspections.isPending || photos.isPending) return <LoadingShape says="Reading what was seen" rows={1} rowClassName="h-44" />;
  if (inspections.isError) return <ErrorState error={inspections.error} onRetry={() => void inspections.refetch()} />;
  const pictures = photos.data ?? [];
  const places = stageShelf(batch, inspections.data, pictures);
  return (
    <>
      <div role="region" aria-label="From the making to now" tabIndex={0} className="relative overflow-x-auto pb-1">
        <ol className="flex min-w-full gap-0">
          <MakingPlace batch={batch} />
          {places.map((place) => <StagePlace key={place.stage} place={place} to={toLook(place.stage)} arePhotosRead={!photos.isError} />)}
          <li aria-hidden="true" className="flex min-w-2 flex-1 flex-col"><span className="h-28" /><span className="h-1.5 bg-ink" /></li>
        </ol>
      </div>
      {photos.isError && <p className="text-note">The photos could not be read just now. <button type="button" className="underline underline-offset-3 coarse:min-h-12" onClick={() => void photos.refetch()}>Try again</button></p>}
    </>
  );
}

const PLACE = 'flex w-44 shrink-0 flex-col max-rack:w-40';

function MakingPlace({ batch }: { batch: AnyBatchView }) {
  const { account, workshop } = useSession();
  const temperature = batch.scentTemperatureC ?? batch.batterTemperatureC;
  return (
    <li className={PLACE}>
      <div className="flex h-28 flex-col justify-end gap-0.5 pb-2 pr-3">
        {temperature !== null && <p className="gauge text-gauge-s leading-none">{showQuantity(temperature, 'temperature', account, 0)}</p>}
        <p className="text-note text-ink-2">
          {temperature !== null && (batch.scentTemperatureC === null ? 'batter. ' : 'when the scent went in. ')}
          {batch.traceAtPour ? `Trace at pour: ${TRACE_WORDS[batch.traceAtPour].split(':')[0]}` : temperature === null && 'no temperature recorded'}
        </p>
      </div>
      <div className="h-1.5 bg-ink" />
      <div className="border-l-2 border-ink px-2 pt-1.5">
        <p className="text-row font-[640]">Making</p>
        <p className="text-note text-ink-2">{formatDay(batch.madeOn)}{batch.pouredAt && `, poured ${clockIn(batch.pouredAt, workshop.timeZone).slice(11)}`}</p>
      </div>
    </li>
  );
}

function StagePlace({ place, to, arePhotosRead }: { place: ShelfPlace; to: string; arePhotosRead: boolean }) {
  const nameOf = useFaultName();
  const { workshop } = useSession();
  const photo = place.photos[0];
  const last = place.inspections.at(-1);
  return (
    <li className={PLACE}>
      <div className="h-28 pr-2">
        {photo ? (
          <Link to={to} className="on-photo relative block h-full bg-well">
            <img src={pictureAddress(photo.id, 'thumb')} alt={photo.alt ?? `${STAGE_WORDS[place.stage]}, ${place.photos.length === 1 ? 'photo' : 'first photo'}`} loading="lazy" className="h-full w-full object-cover" />
            {place.photos.length > 1 && <span className="absolute bottom-0 right-0 bg-ink px-1.5 text-note text-on-ink">{place.photos.length} photos</span>}
          </Link>
        ) : (
          <p className="grid h-full place-items-center border border-dashed border-line-firm p-2 text-center text-note text-ink-2">{last ? (arePhotosRead ? 'no photo taken' : 'photo not read') : 'missed; kept as not looked at'}</p>
        )}
      </div>
      <div className="h-1.5 bg-ink" />
      <div className="border-l-2 border-ink px-2 pt-1.5">
        <Link to={to} className="text-row font-[640] no-underline hover:underline">{STAGE_WORDS[place.stage]}</Link>
        <p className="text-note text-ink-2">{last ? formatDay(clockIn(last.inspectedAt, workshop.timeZone).slice(0, 10)) : 'not looked at'}</p>
        {place.found.length > 0 ? (
          <p className="flex flex-wrap gap-x-2.5 gap-y-1 pt-1">{place.found.map(({ fault, severity }) => <FaultMark key={fault} fault={fault} name={nameOf(fault)} severity={severity} />)}</p>
        ) : last ? (
          <p className="text-note text-ink-2">{place.clear} clear, 0 found</p>
        ) : null}
      </div>
    </li>
  );
}
