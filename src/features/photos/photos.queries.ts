import { queryOptions } from '@tanstack/react-query';
import { photosApi } from '#shared/photos.ts';
import { addressOf, call } from '#src/lib/call.ts';

/** Photos of a batch, oldest first. */
export function photosOfBatchQuery(batchId: string) {
  return queryOptions({
    queryKey: ['photos', 'of-batch', batchId],
    queryFn: async ({ signal }) => (await call(photosApi.list, { query: { batchId }, signal })).items,
  });
}

/** Address of a picture in one of its sizes. */
export function pictureAddress(photoId: string, size: 'thumb' | 'display' | 'original'): string {
  return addressOf(photosApi.picture, { photoId, size });
}
