import type { Client } from 'pg';
import { putPicture } from '#server/features/photos/put-picture.ts';
import { LocalPhotoStore } from '#server/storage/local.ts';
import type { HistoryBatch, HistoryPhoto, WorkshopHistory } from './history/types.ts';
import { drawPictures } from './pictures/draw-pictures.ts';
import type { Region } from './pictures/faults/show-faults.ts';
import { pictureWish } from './pictures/picture-wish.ts';
import { insertRows } from './rows/insert.ts';
import { idAt, type Keys } from './rows/keys.ts';
import { lookKey } from './rows/look-rows.ts';

interface Loading { workshopId: string; history: WorkshopHistory; keys: Keys; uploadsDir: string; mostPhotos?: number; report: (line: string) => void }

type Row = Record<string, unknown>;

/** Threads that draw; the sizes are written meanwhile on the image library's own. */
const workers = 2;

/** Draws the photos of a story, puts them into the store, and writes their rows and the marks on them. */
export async function loadPhotos(client: Client, { workshopId, history, keys, uploadsDir, mostPhotos, report }: Loading): Promise<void> {
  const store = new LocalPhotoStore(uploadsDir);
  const photos = history.batches.flatMap((batch) => batch.photos.map((photo) => ({ batch, photo, wish: pictureWish(batch, photo), id: idAt(photo.takenAt) })));
  const wanted = photos.slice(0, mostPhotos);
  const photoRows: Row[] = [];
  const markRows: Row[] = [];
  await drawPictures(wanted.map(({ wish }) => wish), {
    workers,
    onDone: async (at, { jpeg, regions }) => {
      const one = wanted[at];
      if (!one) return;
      const { batch, photo, wish, id } = one;
      const kept = await putPicture(store, { workshopId, photoId: id, jpeg, zone: history.timeZone });
      photoRows.push({
        id, batch_id: keys.of('batch', batch.code), stage: photo.stage, taken_at: kept.takenAt, taken_offset_minutes: kept.takenOffsetMinutes, camera: kept.camera,
        file_name: wish.fileName, media_type: kept.mediaType, width: kept.width, height: kept.height, bytes: kept.bytes, upload_sha256: kept.uploadSha256,
        stored_sha256: kept.storedSha256, alt: null, uploaded_by: keys.of('member', photo.uploadedBy), created_from: null, version: 1,
        created_at: photo.takenAt, updated_at: photo.takenAt,
      });
      markRows.push(...marksOn(batch, photo, regions, id, keys));
      if (photoRows.length % 50 === 0) report(`${history.name}: ${photoRows.length} of ${wanted.length} photos`);
    },
  });
  await insertRows(client, workshopId, { table: 'photo', rows: photoRows });
  await insertRows(client, workshopId, { table: 'mark', rows: markRows });
}

/** One mark for each finding of the look the photo was taken at, where the fault shows in it. */
function marksOn(batch: HistoryBatch, photo: HistoryPhoto, regions: readonly Region[], photoId: string, keys: Keys): Row[] {
  const look = batch.inspections.filter((l) => l.stage === photo.stage && l.at < photo.takenAt).at(-1);
  if (!look) return [];
  return photo.marks.flatMap((fault) => {
    const region = regions.find((r) => r.fault === fault);
    if (!region || !look.findings.some((f) => f.fault === fault)) return [];
    const { x, y, width, height } = region;
    return [{ id: idAt(photo.takenAt), finding_id: keys.of('finding', `${lookKey(batch, look)} ${fault}`), photo_id: photoId, shape: 'box', x, y, width, height, outline: null }];
  });
}
