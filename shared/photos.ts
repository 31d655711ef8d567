import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { changeOf, recordFields } from './http/fields.ts';
import { Stage } from './words/stages.ts';

export const PHOTO_SIZES = ['thumb', 'display', 'original'] as const;
export const PhotoSize = z.enum(PHOTO_SIZES, { error: 'Size must be thumb, display or original' });
export type PhotoSize = z.infer<typeof PhotoSize>;

/** What an upload may weigh; the client checks the same before it sends. */
export const PHOTO_LIMITS = { fileBytes: 25 * 1024 * 1024, filesAtOnce: 20, pixels: 60_000_000 } as const;

export const PhotoView = z.object({
  ...recordFields,
  batchId: z.string().nullable(),
  batchCode: z.string().nullable(),
  stage: Stage.nullable(),
  /** Stage that the time taken points to, while none is chosen. */
  proposedStage: Stage.nullable(),
  takenAt: z.string().nullable(),
  camera: z.string().nullable(),
  fileName: z.string().nullable(),
  width: z.int(),
  height: z.int(),
  alt: z.string().nullable(),
  uploadedByName: z.string().nullable(),
});
export type PhotoView = z.infer<typeof PhotoView>;

export const ChangePhoto = changeOf({
  batchId: z.uuid().nullable(),
  stage: Stage.nullable(),
  alt: z.string().max(300, 'Description must have at most 300 characters').nullable(),
});
export type ChangePhoto = z.infer<typeof ChangePhoto>;

/** Per file of an upload: the photo, or why not; the good ones go through. */
export const UploadedPhoto = z.discriminatedUnion('outcome', [
  z.object({ outcome: z.literal('kept'), fileName: z.string(), photo: PhotoView }),
  z.object({ outcome: z.literal('refused'), fileName: z.string(), reason: z.string() }),
]);
export type UploadedPhoto = z.infer<typeof UploadedPhoto>;

const params = z.object({ photoId: z.uuid() });

export const photosApi = {
  /**
   * Multipart: fields first (`batchId`, `stage`, both optional; `ids` = one client-made UUID v7 per file,
   * comma-separated, in order), then up to 20 files named `photos`.
   */
  upload: endpoint({ method: 'post', path: '/api/photos', summary: 'Upload photos', right: 'photo.write', accepts: 'multipart/form-data', reply: z.object({ items: z.array(UploadedPhoto) }) }),
  list: endpoint({ method: 'get', path: '/api/photos', summary: 'Photos of a batch, or those not yet tied to one', right: 'workshop.read', query: z.object({ batchId: z.uuid().optional(), stage: Stage.optional() }), reply: z.object({ items: z.array(PhotoView) }) }),
  read: endpoint({ method: 'get', path: '/api/photos/:photoId', summary: 'One photo', right: 'workshop.read', params, reply: PhotoView }),
  change: endpoint({ method: 'patch', path: '/api/photos/:photoId', summary: 'Tie a photo to batch and stage', right: 'photo.write', params, body: ChangePhoto, reply: PhotoView, versioned: true }),
  picture: endpoint({ method: 'get', path: '/api/photos/:photoId/:size', summary: 'The picture', right: 'workshop.read', params: z.object({ photoId: z.uuid(), size: PhotoSize }), streams: 'image/jpeg' }),
};
