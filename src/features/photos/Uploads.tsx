import { useQueryClient } from '@tanstack/react-query';
import { createContext, use, useEffect, useState, useSyncExternalStore, type ReactNode } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { sessionQuery } from '#src/features/session/session.queries.ts';
import { invalidateAfter } from '#src/lib/query-client.ts';
import { putPhoto } from './photos.queries.ts';
import { sendPhoto } from './send-photo.ts';
import { growingWait, isUnfinished, UploadQueue, type Upload } from './upload-queue.ts';

const QueueContext = createContext<UploadQueue | null>(null);

/** Keeps photos on their way over all screens, and asks before the page is left while some are. */
export function UploadsProvider({ children }: { children: ReactNode }) {
  const client = useQueryClient();
  const [queue] = useState(() => new UploadQueue({
    send: sendPhoto,
    makeId: () => uuidv7(),
    onKept: (photo) => { putPhoto(client, photo); void invalidateAfter(client, 'photos'); },
    waitMs: growingWait,
    preview: { make: (file) => URL.createObjectURL(file), drop: (address) => URL.revokeObjectURL(address) },
  }));

  useEffect(() => {
    const whoIs = () => client.getQueryData(sessionQuery.queryKey)?.member.id;
    let before = whoIs();
    return client.getQueryCache().subscribe(() => {
      const now = whoIs();
      if (now === before) return;
      if (before !== undefined) queue.forgetAll();
      before = now;
    });
  }, [client, queue]);

  useEffect(() => {
    const askFirst = (event: BeforeUnloadEvent) => { if (queue.snapshot().some(isUnfinished)) event.preventDefault(); };
    const online = () => queue.tryAllAgain();
    // A picture dropped beside its place would replace the page.
    const stay = (event: DragEvent) => { if (event.dataTransfer?.types.includes('Files')) event.preventDefault(); };
    window.addEventListener('beforeunload', askFirst);
    window.addEventListener('online', online);
    window.addEventListener('dragover', stay);
    window.addEventListener('drop', stay);
    return () => {
      window.removeEventListener('beforeunload', askFirst);
      window.removeEventListener('online', online);
      window.removeEventListener('dragover', stay);
      window.removeEventListener('drop', stay);
    };
  }, [queue]);

  return <QueueContext value={queue}>{children}</QueueContext>;
}

/** The photos on their way, and the queue that takes more. */
export function useUploads(): { uploads: readonly Upload[]; queue: UploadQueue } {
  const queue = use(QueueContext);
  if (!queue) throw new Error('useUploads needs the UploadsProvider above it');
  return { uploads: useSyncExternalStore(queue.subscribe, queue.snapshot), queue };
}
