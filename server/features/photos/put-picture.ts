import { randomUUID } from 'node:crypto';
import { rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import type { PhotoStore } from '#server/storage/photo-store.ts';
import { rowValues } from './photos.service.ts';
import { renderPicture, sha256Of } from './render.ts';

/**
 * Puts a picture of our own making into the store and gives the columns of its row, e.g. for the demo.
 * Works in this process: what comes from outside goes through `keepPhotos`.
 *
 * @param jpeg bytes of a JPEG with its EXIF
 * @param zone the workshop's time zone, for a picture whose EXIF names no offset
 * @throws Error when the bytes are no picture that can be read
 */
export async function putPicture(store: PhotoStore, { workshopId, photoId, jpeg, zone }: { workshopId: string; photoId: string; jpeg: Buffer; zone: string }) {
  const upload = path.join(await store.incomingFolder(), randomUUID());
  await writeFile(upload, jpeg);
  try {
    const uploadSha256 = await sha256Of(upload);
    const draft = await store.draft({ workshopId, photoId, uploadSha256 });
    try {
      const rendered = await renderPicture(upload, draft.paths);
      if ('why' in rendered) throw new Error(`A picture of our own making cannot be read: ${rendered.why}`);
      await draft.keep();
      return { uploadSha256, ...rowValues(rendered, zone) };
    } finally {
      await draft.drop();
    }
  } finally {
    await rm(upload, { force: true });
  }
}
