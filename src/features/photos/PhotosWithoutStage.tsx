import type { PhotoView } from '#shared/photos.ts';
import { Block } from '#src/components/Block.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { useMay, useSession } from '#src/features/session/session.queries.ts';
import { formatCount, formatInstant } from '#src/lib/format.ts';
import { STAGE_WORDS } from '#src/lib/words.ts';
import { useChangePhoto } from './photos.queries.ts';
import { PhotoThumb } from './PhotoStrip.tsx';

/** Photos that no stage has yet: the one that their time points to is a touch away. */
export function PhotosWithoutStage({ photos, onOpen }: { photos: readonly PhotoView[]; onOpen: (id: string) => void }) {
  const { workshop } = useSession();
  const may = useMay()('photo.write');
  const change = useChangePhoto();
  const toasts = useToasts();
  if (photos.length === 0) return null;

  const place = (photo: PhotoView, stage: PhotoView['stage']) => change.mutate({ photo, change: { stage } }, {
    onSuccess: (placed) => { if (stage) toasts.tell(`Photo put at ${STAGE_WORDS[stage].toLowerCase()}`, () => place(placed, null)); },
    onError: (error) => toasts.tell(error.message),
  });
  const placeAll = async () => {
    const placed = await Promise.allSettled(proposed.map((photo) => change.mutateAsync({ photo, change: { stage: photo.proposedStage } })));
    const missed = placed.filter(({ status }) => status === 'rejected').length;
    toasts.tell(missed === 0 ? `${formatCount(placed.length, 'photo')} put at their stages` : `${formatCount(missed, 'photo')} could not be placed; try again`);
  };
  const proposed = photos.filter(({ proposedStage }) => proposedStage !== null);
  return (
    <div className="grid gap-2">
      <h3>{photos.length === 1 ? '1 photo has no stage yet' : `${photos.length} photos have no stage yet`}</h3>
      <ul className="grid gap-2 bench:grid-cols-2">
        {photos.map((photo) => (
          <li key={photo.id} className="flex items-center gap-3 bg-tray">
            <PhotoThumb photo={photo} onOpen={onOpen} />
            <div className="grid min-w-0 gap-1.5 py-1 pr-2">
              <p className="truncate text-note text-ink-2">{photo.takenAt ? `taken ${formatInstant(photo.takenAt, workshop.timeZone)}` : 'no time in the picture'}</p>
              {may && (
                <div className="flex flex-wrap gap-2">
                  {photo.proposedStage && <Block busy={change.isPending && change.variables.photo.id === photo.id && 'Keeping …'} onClick={() => place(photo, photo.proposedStage)}>{STAGE_WORDS[photo.proposedStage]}</Block>}
                  <Block kind="quiet" onClick={() => onOpen(photo.id)}>{photo.proposedStage ? 'Another' : 'Choose the stage'}</Block>
                </div>
              )}
            </div>
          </li>
        ))}
      </ul>
      {may && proposed.length > 1 && <Block className="justify-self-start" onClick={() => void placeAll()}>Put all {proposed.length} where their time points to</Block>}
    </div>
  );
}
