import { v7 as uuidv7 } from 'uuid';
import { z } from 'zod';
import { photosApi } from '#shared/photos.ts';
import { id } from '#shared/http/fields.ts';
import { Stage } from '#shared/words/stages.ts';
import type { Api } from '#server/http/api.ts';
import { invalidField } from '#server/problem.ts';
import { handOut } from './hand-out.ts';
import { listPhotos, readPhoto } from './photos.read.ts';
import { type PhotoKit, changePhoto, clearIncoming, keepPhotos } from './photos.service.ts';
import { plain } from './picture-facts.ts';
import { takeIn } from './take-in.ts';

/** Empty fields of a form mean "not chosen". */
const chosen = <S extends z.ZodType>(schema: S) => z.preprocess((value) => (value === '' ? undefined : value), schema.optional());
const FormFields = z.strictObject({
  batchId: chosen(z.uuid({ error: 'Batch must be an id' })),
  stage: chosen(Stage),
  ids: chosen(z.string().max(1000).transform((text) => text.split(',').map((part) => part.trim())).pipe(z.array(id))),
});

export function photosRoutes(api: Api, kit: PhotoKit): void {
  api.upload(photosApi.upload, takeIn(kit.store), async ({ request, work }) => {
    const files = (request.files ?? []) as Express.Multer.File[];
    try {
      const { batchId = null, stage = null, ids } = FormFields.parse({ ...(request.body as object) });
      if (files.length === 0) throw invalidField('#/photos', 'Send at least one picture in the field named photos');
      if (ids && (ids.length !== files.length || new Set(ids).size !== ids.length)) throw invalidField('#/ids', `Give one id for each of the ${files.length} files, in their order`);
      const incoming = files.map((file, index) => ({ path: file.path, fileName: fileNameOf(file.originalname), id: ids?.[index] ?? uuidv7() }));
      return await keepPhotos(work, kit, incoming, { batchId, stage });
    } finally {
      await clearIncoming(files.map((file) => file.path));
    }
  });
  api.serve(photosApi.list, ({ tx, query }) => listPhotos(tx, query));
  api.serve(photosApi.read, ({ tx, params }) => readPhoto(tx, params.photoId));
  api.serve(photosApi.change, ({ tx, params, body, version }) => changePhoto(tx, params.photoId, body, version));
  api.file(photosApi.picture, ({ work, params, request, response }) => handOut(work, kit.store, params.photoId, params.size, { request, response }));
}

/** A file's name is data to be shown, never a path. */
function fileNameOf(name: string): string {
  return plain(name).slice(0, 200) || 'photo';
}
