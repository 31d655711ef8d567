import type { z } from 'zod';
import { dayIn } from '#shared/units/zones.ts';
import type { PhotoView } from '#shared/photos.ts';
import type { Method } from '#shared/words/methods.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import type { PictureKey } from '#server/storage/photo-store.ts';
import { notFound } from '#server/problem.ts';
import { proposedStage } from './stage-of-photo.ts';

type View = z.input<typeof PhotoView>;
type Row = Omit<View, 'createdAt' | 'updatedAt' | 'takenAt' | 'proposedStage'> & {
  createdAt: Date; updatedAt: Date; takenAt: Date | null; offsetMinutes: number | null; zone: string;
  method: Method | null; madeOn: string | null; unmouldedOn: string | null; cutOn: string | null;
};

/** A workshop's newest photos that no batch has yet; older ones show as these are tied. */
const MOST_LOOSE = 500;

const PHOTOS = `
  select p.id, p.version, p.created_at "createdAt", p.updated_at "updatedAt", p.batch_id "batchId", b.code "batchCode", p.stage, p.taken_at "takenAt",
    p.taken_offset_minutes "offsetMinutes", p.camera, p.file_name "fileName", p.width, p.height, p.alt, m.name "uploadedByName",
    w.time_zone zone, b.method, b.made_on::text "madeOn", b.unmoulded_on::text "unmouldedOn", b.cut_on::text "cutOn"
  from photo p
  join workshop w on w.id = p.workshop_id
  left join batch b on b.workshop_id = p.workshop_id and b.id = p.batch_id
  left join member m on m.workshop_id = p.workshop_id and m.id = p.uploaded_by`;
const BY_ID = `${PHOTOS} where p.id = $1`;
const OF_BATCH = `${PHOTOS} where p.batch_id = $1 and ($2::text is null or p.stage = $2) order by coalesce(p.taken_at, p.created_at), p.id`;
const LOOSE = `${PHOTOS} where p.batch_id is null and ($2::text is null or p.stage = $2) order by coalesce(p.taken_at, p.created_at) desc, p.id desc limit $1`;

function photoView({ offsetMinutes, zone, method, madeOn, unmouldedOn, cutOn, ...row }: Row): View {
  const proposed = row.stage === null && row.takenAt !== null && method !== null && madeOn !== null
    ? proposedStage({ method, madeOn, unmouldedOn: unmouldedOn ?? undefined, cutOn: cutOn ?? undefined, linoleicRich: true }, dayTaken(row.takenAt, offsetMinutes, zone))
    : undefined;
  return {
    ...row, createdAt: row.createdAt.toISOString(), updatedAt: row.updatedAt.toISOString(), takenAt: row.takenAt?.toISOString() ?? null, proposedStage: proposed ?? null,
  };
}

/** The day on the camera's own clock, or on the workshop's where the camera did not say how far ahead it was. */
function dayTaken(takenAt: Date, offsetMinutes: number | null, zone: string): string {
  if (offsetMinutes === null) return dayIn(zone, takenAt);
  return new Date(takenAt.getTime() + offsetMinutes * 60_000).toISOString().slice(0, 10);
}

/** One photo. @throws Problem 404 */
export async function readPhoto(tx: WorkshopTransaction, photoId: string): Promise<View> {
  const row = await tx.row<Row>(BY_ID, [photoId]);
  if (!row) throw notFound('photo');
  return photoView(row);
}

/** Photos of a batch in the order they were taken, or, without one, those not tied to any, newest first. */
export async function listPhotos(tx: WorkshopTransaction, { batchId, stage }: { batchId?: string | undefined; stage?: string | undefined }): Promise<{ items: View[] }> {
  const rows = batchId === undefined ? await tx.rows<Row>(LOOSE, [MOST_LOOSE, stage ?? null]) : await tx.rows<Row>(OF_BATCH, [batchId, stage ?? null]);
  return { items: rows.map(photoView) };
}

/** What is needed to hand a picture out. */
export interface PictureFacts {
  key: PictureKey;
  mediaType: string;
  storedSha256: string;
}

/** Where a photo's pictures lie; asked under the wall, before any file is touched. @throws Problem 404 */
export async function readPictureFacts(tx: WorkshopTransaction, photoId: string): Promise<PictureFacts> {
  const row = await tx.row<{ mediaType: string; uploadSha256: string; storedSha256: string }>(
    'select media_type "mediaType", upload_sha256 "uploadSha256", stored_sha256 "storedSha256" from photo where id = $1', [photoId],
  );
  if (!row) throw notFound('photo');
  return { key: { workshopId: tx.workshopId, photoId, uploadSha256: row.uploadSha256 }, mediaType: row.mediaType, storedSha256: row.storedSha256 };
}
