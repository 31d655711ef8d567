import { rm } from 'node:fs/promises';
import type { ChangePhoto, UploadedPhoto } from '#shared/photos.ts';
import { instantIn } from '#shared/units/zones.ts';
import type { Stage } from '#shared/words/stages.ts';
import { fingerprint, insertOnce, lockForChange, saveChange } from '#server/db/records.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import type { Work } from '#server/http/api.ts';
import { Problem, conflict, invalidField } from '#server/problem.ts';
import type { PhotoStore } from '#server/storage/photo-store.ts';
import type { Decoders } from './decoders.ts';
import { Photo } from './photo.entity.ts';
import { readPhoto } from './photos.read.ts';
import { refusalInWords } from './refusal-words.ts';
import { type Rendered, sha256Of } from './render.ts';

export interface PhotoKit {
  store: PhotoStore;
  decoders: Decoders;
}

/** A file that came in, with the id its client made for the photo. */
export interface IncomingFile {
  path: string;
  fileName: string;
  id: string;
}

export interface TiedTo {
  batchId: string | null;
  stage: Stage | null;
}

interface Surroundings {
  workshopId: string;
  zone: string;
}

/**
 * Keeps the photos among the files and says of each other why not. Files are on disk, flushed and named,
 * before their row is written, so that an answer of "kept" is never lost.
 *
 * @throws Problem 422 for a batch that is not in this workshop, 503 when too many wait
 */
export async function keepPhotos(work: Work, kit: PhotoKit, files: readonly IncomingFile[], tied: TiedTo): Promise<{ items: UploadedPhoto[] }> {
  const around = await work(async (tx): Promise<Surroundings> => {
    if (tied.batchId !== null && !(await tx.row('select 1 from batch where id = $1', [tied.batchId]))) throw invalidField('#/batchId', 'There is no such batch in this workshop');
    const workshop = await tx.row<{ zone: string }>('select time_zone zone from workshop where id = $1', [tx.workshopId]);
    return { workshopId: tx.workshopId, zone: workshop?.zone ?? 'UTC' };
  });
  return { items: await Promise.all(files.map((file) => keepPhoto(work, kit, around, file, tied))) };
}

async function keepPhoto(work: Work, kit: PhotoKit, around: Surroundings, file: IncomingFile, tied: TiedTo): Promise<UploadedPhoto> {
  const uploadSha256 = await sha256Of(file.path);
  const body = { uploadSha256, ...tied };
  const known = await work((tx) => photoOf(tx, file.id, body));
  if (known) return { fileName: file.fileName, ...known };

  const draft = await kit.store.draft({ workshopId: around.workshopId, photoId: file.id, uploadSha256 });
  try {
    const decoded = await kit.decoders.render(file.path, draft.paths);
    if ('why' in decoded) return { outcome: 'refused', fileName: file.fileName, reason: refusalInWords(decoded) };
    await draft.keep();
    const photo = await work(async (tx) => {
      await insertOnce(tx, Photo, 'photo', { id: file.id, ...rowValues(decoded, around.zone), ...tied, fileName: file.fileName, uploadSha256, alt: null, uploadedBy: tx.member.id, version: 1, updatedAt: tx.now }, body);
      return readPhoto(tx, file.id);
    });
    return { outcome: 'kept', fileName: file.fileName, photo };
  } catch (error) {
    if (error instanceof Problem && error.code === 'conflict') return { outcome: 'refused', fileName: file.fileName, reason: error.detail };
    throw error;
  } finally {
    await draft.drop();
  }
}

/** What an earlier try with this id came to: the photo, or that the id holds another. */
async function photoOf(tx: WorkshopTransaction, photoId: string, body: object) {
  const photo = await tx.manager.findOne(Photo, { where: { id: photoId } });
  if (!photo) return undefined;
  if (photo.createdFrom !== fingerprint(body)) return { outcome: 'refused' as const, reason: 'Another photo already has this id' };
  return { outcome: 'kept' as const, photo: await readPhoto(tx, photoId) };
}

/** Columns that come from the picture. A camera that names no offset is taken to be on the workshop's clock. */
export function rowValues(rendered: Rendered, zone: string) {
  const { localTime, offsetMinutes, ...picture } = rendered;
  const takenAt = localTime === null ? null : offsetMinutes === null ? instantIn(zone, localTime) : new Date(Date.parse(`${localTime}Z`) - offsetMinutes * 60_000);
  return { ...picture, takenAt, takenOffsetMinutes: offsetMinutes };
}

/** Removes what an upload left in the incoming folder, whatever became of it. */
export async function clearIncoming(paths: readonly string[]): Promise<void> {
  await Promise.all(paths.map((path) => rm(path, { force: true })));
}

/**
 * Ties a photo to batch and stage, or describes it.
 *
 * @throws Problem 404, 412 stale, 409 when marks of its batch sit on it, 422 for a batch that is not there
 */
export async function changePhoto(tx: WorkshopTransaction, photoId: string, change: ChangePhoto, version: number) {
  const seen = await readPhoto(tx, photoId);
  const batches = [...new Set([seen.batchId, change.batchId].filter((id): id is string => typeof id === 'string'))].sort();
  // Marks are placed under the batch's lock, so that none can come between the check and the move.
  const locked = await tx.rows<{ id: string }>('select id from batch where id = any($1::uuid[]) order by id for update', [batches]);
  const photo = await lockForChange(tx, Photo, 'photo', photoId, version, () => readPhoto(tx, photoId));
  if (change.batchId && !locked.some(({ id }) => id === change.batchId)) throw invalidField('#/batchId', 'There is no such batch in this workshop');
  if (change.batchId !== undefined && change.batchId !== photo.batchId && (await tx.row('select 1 from mark where photo_id = $1', [photoId]))) {
    throw conflict('Marks of its batch sit on this photo; take them off before moving it');
  }
  Object.assign(photo, change);
  await saveChange(tx, Photo, photo);
  return readPhoto(tx, photoId);
}
