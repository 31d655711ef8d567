import { queryOptions, useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { photosApi, type ChangePhoto, type PhotoView } from '#shared/photos.ts';
import { addressOf, call } from '#src/lib/call.ts';
import { invalidateAfter } from '#src/lib/query-client.ts';

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

/** Writes one photo, as the server answered it, into the list of its batch. */
export function putPhoto(client: QueryClient, photo: PhotoView): void {
  if (photo.batchId === null) return;
  client.setQueryData(photosOfBatchQuery(photo.batchId).queryKey, (list: PhotoView[] | undefined) => {
    if (!list) return list;
    return list.some(({ id }) => id === photo.id) ? list.map((other) => (other.id === photo.id ? photo : other)) : [...list, photo];
  });
}

/** Ties a photo to a stage, or describes it. */
export function useChangePhoto() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ photo, change }: { photo: Pick<PhotoView, 'id' | 'version'>; change: ChangePhoto }) => call(photosApi.change, { params: { photoId: photo.id }, body: change, version: photo.version }),
    onSuccess: (photo) => {
      putPhoto(client, photo);
      return invalidateAfter(client, 'photos');
    },
  });
}
