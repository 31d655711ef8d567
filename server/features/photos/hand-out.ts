import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import type { PhotoSize } from '#shared/photos.ts';
import type { Work } from '#server/http/api.ts';
import { notFound } from '#server/problem.ts';
import type { PhotoStore } from '#server/storage/photo-store.ts';
import { readPictureFacts } from './photos.read.ts';

const FRESH_SECONDS = 3_600;

/**
 * Hands one size of a photo to somebody who may see it. No connection of the database is held while bytes go out.
 *
 * @throws Problem 404, the same for a photo next door
 */
export async function handOut(work: Work, store: PhotoStore, photoId: string, size: PhotoSize, { request, response }: { request: Request; response: Response }): Promise<void> {
  const facts = await work((tx) => readPictureFacts(tx, photoId));
  const etag = `"${facts.storedSha256.slice(0, 32)}-${size}"`;
  const mediaType = size === 'original' ? facts.mediaType : 'image/jpeg';
  response.set({
    ETag: etag,
    'Cache-Control': `private, max-age=${FRESH_SECONDS}`,
    Vary: 'Cookie',
    'Content-Security-Policy': `default-src 'none'; sandbox`,
    'X-Content-Type-Options': 'nosniff',
  });
  if (request.get('If-None-Match')?.split(',').some((seen) => seen.trim().replace(/^W\//, '') === etag)) {
    response.status(304).end();
    return;
  }
  const picture = await store.open(facts.key, size);
  if (!picture) throw notFound('photo');
  response.set({
    'Content-Type': mediaType,
    'Content-Length': String(picture.bytes),
    'Content-Disposition': `inline; filename="${photoId}.${mediaType === 'image/png' ? 'png' : 'jpg'}"`,
  });
  if (request.method === 'HEAD') {
    picture.stream.destroy();
    response.end();
    return;
  }
  // A reader that leaves half-way is no fault of ours.
  await pipeline(picture.stream, response).catch((error: NodeJS.ErrnoException) => {
    if (error.code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error;
  });
}
