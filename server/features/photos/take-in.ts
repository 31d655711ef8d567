import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import multer, { MulterError } from 'multer';
import { PHOTO_LIMITS } from '#shared/photos.ts';
import { busy, invalidField, malformed, tooLarge, unsupportedMedia } from '#server/problem.ts';
import type { PhotoStore } from '#server/storage/photo-store.ts';

/** Nesting and indices in field names are unlimited by default, so `a[4294967294]` must be closed by name. */
const LIMITS: multer.Options['limits'] = {
  fileSize: PHOTO_LIMITS.fileBytes, files: PHOTO_LIMITS.filesAtOnce, fields: 20, parts: 40, fieldSize: 64 * 1024, fieldNameSize: 100, headerPairs: 50,
  fieldNestingDepth: 0, fieldArrayIndexLimit: 0,
};

/** Takes the files of an upload into the store's private folder under names of our own making. */
export function takeIn(store: PhotoStore): RequestHandler {
  const form = multer({
    storage: multer.diskStorage({
      destination: (_request, _file, done) => void store.incomingFolder().then((folder) => done(null, folder), (error: Error) => done(error, '')),
      filename: (_request, _file, done) => done(null, randomUUID()),
    }),
    limits: LIMITS,
    defParamCharset: 'utf8',
  }).array('photos', PHOTO_LIMITS.filesAtOnce);
  return (request, response, next) => {
    if (!request.is('multipart/form-data')) return next(unsupportedMedia('Send the photos as a form (Content-Type: multipart/form-data)'));
    form(request, response, (error: unknown) => (error ? next(problemOfForm(error)) : next()));
  };
}

function problemOfForm(error: unknown): unknown {
  if (error instanceof MulterError) {
    if (error.code === 'LIMIT_FILE_SIZE') return tooLarge(`A photo may weigh at most ${PHOTO_LIMITS.fileBytes / 1024 / 1024} MiB`);
    if (error.code === 'LIMIT_FILE_COUNT') return tooLarge(`At most ${PHOTO_LIMITS.filesAtOnce} photos at once`);
    if (error.code === 'LIMIT_UNEXPECTED_FILE') return invalidField('#/photos', `Send at most ${PHOTO_LIMITS.filesAtOnce} pictures at once, all in the field named photos`);
    return malformed(`The upload could not be read: ${error.message}`);
  }
  // The disk's own errors carry a code; all that is left is a form that broke off or never was one.
  const code = (error as NodeJS.ErrnoException).code;
  if (code === 'ENOSPC' || code === 'EDQUOT') return busy('The photo store is full', 60);
  return code?.startsWith('E') && code !== 'ECONNRESET' && code !== 'ECONNABORTED' ? error : malformed('The upload broke off, or is not a well-formed form');
}
