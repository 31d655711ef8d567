import { Camera, ImagePlus } from 'lucide-react';
import { useRef, useState, type DragEvent } from 'react';
import { PHOTO_LIMITS } from '#shared/photos.ts';
import { Block } from '#src/components/Block.tsx';
import { useMay } from '#src/features/session/session.queries.ts';
import { PHOTO_KINDS } from './fit-to-send.ts';
import { UploadList } from './UploadList.tsx';
import type { UploadTo } from './upload-queue.ts';
import { useUploads } from './Uploads.tsx';

/**
 * Takes in photos of one batch: from the camera, from the device, or dropped. They go on their way at once, and
 * go on going while other screens are open. With `stage` null each photo proposes its own from the time it was taken.
 */
export function PhotoAdder({ batchId, batchCode, stage }: UploadTo) {
  const { uploads, queue } = useUploads();
  const may = useMay();
  const camera = useRef<HTMLInputElement>(null);
  const files = useRef<HTMLInputElement>(null);
  const [isOver, setOver] = useState(false);
  if (!may('photo.write')) return null;

  const take = (list: FileList | null) => {
    if (list && list.length > 0) queue.add(list, { batchId, batchCode, stage });
  };
  const over = (event: DragEvent) => {
    if (!event.dataTransfer.types.includes('Files')) return;
    event.preventDefault();
    setOver(true);
  };
  const input = { type: 'file', accept: PHOTO_KINDS, tabIndex: -1, 'aria-hidden': true, className: 'hidden' } as const;
  return (
    <section
      aria-label="Add photos"
      className={`grid gap-2 ${isOver ? 'outline-3 outline-dashed outline-offset-6 outline-ink' : ''}`}
      onDragEnter={over}
      onDragOver={over}
      onDragLeave={(event) => { if (!event.currentTarget.contains(event.relatedTarget as Node | null)) setOver(false); }}
      onDrop={(event) => { event.preventDefault(); setOver(false); take(event.dataTransfer.files); }}
    >
      <div className="flex flex-wrap items-center gap-2">
        {/* A camera is asked for where there are fingers; elsewhere it would open the same file list twice. */}
        <span className="hidden coarse:contents"><Block className="max-rack:flex-1" onClick={() => camera.current?.click()}><Camera size={18} aria-hidden="true" />Take a photo</Block></span>
        <Block className="max-rack:flex-1" onClick={() => files.current?.click()}><ImagePlus size={18} aria-hidden="true" />Choose photos</Block>
        <p className="text-note text-ink-2 coarse:hidden">{isOver ? 'Let go to add them' : 'or drop them here.'} JPEG, PNG or WebP, up to {PHOTO_LIMITS.fileBytes / 1024 / 1024} MiB each.</p>
      </div>
      {/* Emptied after each choice, so that the same photo can be chosen again. */}
      <input ref={camera} {...input} capture="environment" onChange={(event) => { take(event.target.files); event.target.value = ''; }} />
      <input ref={files} {...input} multiple data-photos onChange={(event) => { take(event.target.files); event.target.value = ''; }} />
      <UploadList uploads={uploads.filter((upload) => upload.batchId === batchId)} />
    </section>
  );
}
