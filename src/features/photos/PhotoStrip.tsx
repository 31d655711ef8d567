import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { PhotoView } from '#shared/photos.ts';
import { STAGES, type Stage } from '#shared/words/stages.ts';
import { Rail } from '#src/components/Rail.tsx';
import { EmptyState, ErrorState, LoadingShape } from '#src/components/states.tsx';
import { formatCount, formatDay } from '#src/lib/format.ts';
import { STAGE_WORDS } from '#src/lib/words.ts';
import { PhotoAdder } from './PhotoAdder.tsx';
import { PhotoDialog } from './PhotoDialog.tsx';
import { photosOfBatchQuery, pictureAddress } from './photos.queries.ts';
import { PhotosWithoutStage } from './PhotosWithoutStage.tsx';

/** All photos of a batch by stage, those without one first, and the place where more are added. */
export function PhotoStrip({ batchId, batchCode }: { batchId: string; batchCode: string }) {
  const photos = useQuery(photosOfBatchQuery(batchId));
  const [openId, setOpenId] = useState<string | null>(null);
  const all = photos.data ?? [];
  const open = all.find(({ id }) => id === openId);
  return (
    <section className="grid grid-cols-1 gap-3" aria-labelledby="photos-heading">
      <Rail id="photos-heading" heading="Photos" aside={photos.data && formatCount(all.length, 'photo')} />
      <PhotoAdder batchId={batchId} batchCode={batchCode} stage={null} />
      {photos.isPending && <LoadingShape says="Fetching the photos" rows={1} rowClassName="h-24" />}
      {photos.isError && <ErrorState error={photos.error} onRetry={() => void photos.refetch()} />}
      {photos.isSuccess && all.length === 0 && <EmptyState title={`No photo of ${batchCode} yet`}>A photo of the cut face and one of the top are enough to begin with.</EmptyState>}
      <PhotosWithoutStage photos={all.filter(({ stage }) => stage === null)} onOpen={setOpenId} />
      {all.some(({ stage }) => stage !== null) && (
        <div role="region" aria-label="Photos by stage" tabIndex={0} className="flex gap-6 overflow-x-auto pb-1">
          {STAGES.map((stage) => <StageGroup key={stage} stage={stage} photos={all.filter((photo) => photo.stage === stage)} onOpen={setOpenId} />)}
        </div>
      )}
      {open && <PhotoDialog key={open.id} photo={open} onClose={() => setOpenId(null)} />}
    </section>
  );
}

function StageGroup({ stage, photos, onOpen }: { stage: Stage; photos: readonly PhotoView[]; onOpen: (id: string) => void }) {
  if (photos.length === 0) return null;
  return (
    <div className="grid shrink-0 content-start gap-1">
      <h3>{STAGE_WORDS[stage]} <span className="font-normal text-ink-2">{photos.length}</span></h3>
      <ul className="flex gap-1.5">
        {photos.map((photo) => <li key={photo.id}><PhotoThumb photo={photo} onOpen={onOpen} /></li>)}
      </ul>
    </div>
  );
}

/** A small picture that opens the large one. */
export function PhotoThumb({ photo, onOpen }: { photo: PhotoView; onOpen: (id: string) => void }) {
  const says = photo.alt ?? [photo.stage && STAGE_WORDS[photo.stage], photo.takenAt && `taken ${formatDay(photo.takenAt.slice(0, 10))}`].filter(Boolean).join(', ');
  return (
    <button type="button" className="on-photo block bg-well" aria-label={`Open photo: ${says || (photo.fileName ?? 'without a stage')}`} onClick={() => onOpen(photo.id)}>
      <img src={pictureAddress(photo.id, 'thumb')} alt="" width={132} height={88} loading="lazy" className="h-22 w-33 object-cover" />
    </button>
  );
}
