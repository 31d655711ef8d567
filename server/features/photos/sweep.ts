import type { Logger } from 'pino';
import type { DataSource } from 'typeorm';
import { inWorkshop } from '#server/db/workshop-transaction.ts';
import { type PhotoStore, uploadPrint } from '#server/storage/photo-store.ts';

const HOUR_MS = 3_600_000;

/**
 * Removes files that no photo's row names: what a crash left between file and row.
 *
 * @param olderThanMs younger files may still get their row
 */
export async function sweepPhotos(source: DataSource, store: PhotoStore, now: Date, olderThanMs = HOUR_MS): Promise<{ removed: number }> {
  return store.sweep(now, olderThanMs, async (workshopId, photoId, print) => {
    const nobody = { id: '', accountId: '', workshopId, name: 'sweep', role: 'viewer' as const };
    return inWorkshop(source, nobody, { requestId: 'sweep', now, kind: 'read' }, async (tx) => {
      const row = await tx.row<{ sha: string }>('select upload_sha256 sha from photo where id = $1', [photoId]);
      return row !== undefined && uploadPrint(row.sha) === print;
    });
  });
}

/** Sweeps at the start and every hour until stopped; a sweep that fails is tried again in an hour. */
export function keepSwept(source: DataSource, store: PhotoStore, logger: Logger): () => void {
  const sweep = () => {
    void sweepPhotos(source, store, new Date()).then(
      ({ removed }) => removed > 0 && logger.info({ removed }, 'photo files without a row removed'),
      (error: unknown) => logger.warn({ err: error }, 'photo store could not be swept'),
    );
  };
  sweep();
  const timer = setInterval(sweep, HOUR_MS);
  timer.unref();
  return () => clearInterval(timer);
}
