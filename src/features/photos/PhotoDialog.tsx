import { useState } from 'react';
import type { PhotoView } from '#shared/photos.ts';
import { STAGES, type Stage } from '#shared/words/stages.ts';
import { Block } from '#src/components/Block.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { ErrorState } from '#src/components/states.tsx';
import { SelectField, TextField } from '#src/components/TextField.tsx';
import { useMay, useSession } from '#src/features/session/session.queries.ts';
import { formatInstant } from '#src/lib/format.ts';
import { optionsOf, STAGE_WORDS } from '#src/lib/words.ts';
import { pictureAddress, useChangePhoto } from './photos.queries.ts';

/** One photo with what is known of it; its stage and description can be mended here. */
export function PhotoDialog({ photo, onClose }: { photo: PhotoView; onClose: () => void }) {
  const { workshop } = useSession();
  const may = useMay();
  const change = useChangePhoto();
  const [stage, setStage] = useState<Stage | ''>(photo.stage ?? photo.proposedStage ?? '');
  const [alt, setAlt] = useState(photo.alt ?? '');
  const keep = () => change.mutate({ photo, change: { stage: stage || null, alt: alt.trim() || null } }, { onSuccess: onClose });
  const facts = [
    photo.takenAt ? `Taken ${formatInstant(photo.takenAt, workshop.timeZone)}` : 'No time in the picture',
    photo.camera && `with ${photo.camera}`, photo.uploadedByName && `added by ${photo.uploadedByName}`, photo.fileName,
  ].filter(Boolean);
  return (
    <Dialog title={photo.batchCode ? `Photo of ${photo.batchCode}` : 'Photo'} isOpen onClose={onClose}>
      <img src={pictureAddress(photo.id, 'display')} alt={photo.alt ?? 'The photo'} width={photo.width} height={photo.height} className="max-h-[52vh] w-full bg-well object-contain" />
      <p className="text-note text-ink-2">{facts.join(', ')}.</p>
      {may('photo.write') ? (
        <form className="grid gap-3" onSubmit={(event) => { event.preventDefault(); keep(); }}>
          <SelectField label="Stage" hint={photo.stage === null && photo.proposedStage ? 'Proposed from the time it was taken' : undefined} value={stage} emptyLabel="No stage yet" options={optionsOf(STAGES, STAGE_WORDS)} onChange={(event) => setStage(event.target.value as Stage | '')} />
          <TextField label="Description" isOptional hint="For whoever cannot see the picture" value={alt} maxLength={300} onChange={(event) => setAlt(event.target.value)} />
          {change.isError && <ErrorState error={change.error} />}
          <Block type="submit" kind="main" busy={change.isPending && 'Keeping …'}>Keep</Block>
        </form>
      ) : <p className="text-row">{stage ? STAGE_WORDS[stage] : 'No stage yet'}</p>}
    </Dialog>
  );
}
