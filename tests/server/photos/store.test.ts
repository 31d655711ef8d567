import { mkdtemp, readdir, rm, utimes, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import sharp from 'sharp';
import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { takenWith } from '#server/features/photos/picture-facts.ts';
import { putPicture } from '#server/features/photos/put-picture.ts';
import { proposedStage } from '#server/features/photos/stage-of-photo.ts';
import { sweepPhotos } from '#server/features/photos/sweep.ts';
import { LocalPhotoStore } from '#server/storage/local.ts';
import { instantIn } from '#shared/units/zones.ts';
import { appForFile } from '#tests/support/app.ts';
import { aJpeg, aPhoto } from '#tests/support/pictures.ts';
import { aWorkshop } from '#tests/support/world.ts';

const app = appForFile();
const HOUR = 3_600_000;

describe('the photo store', () => {
  it('removes files that no row names, once they are an hour old, and nothing else', async () => {
    const world = await aWorkshop(app());
    const photo = await aPhoto(world.owner);
    const store = new LocalPhotoStore(app().uploadsDir);
    const lost = await putPicture(store, { workshopId: world.workshopId, photoId: uuidv7(), jpeg: await aJpeg(), zone: 'UTC' });
    expect(lost.uploadSha256).toMatch(/^[\da-f]{64}$/);
    const other = await putPicture(store, { workshopId: world.workshopId, photoId: photo.id, jpeg: await aJpeg(30, 30), zone: 'UTC' });
    const stray = path.join(await store.incomingFolder(), 'left-by-a-crash');
    await writeFile(stray, 'x');
    const now = new Date();
    expect(await sweepPhotos(app().loafmark.source, store, now)).toEqual({ removed: 0 });
    await utimes(stray, new Date(now.getTime() - 2 * HOUR), new Date(now.getTime() - 2 * HOUR));
    expect(await sweepPhotos(app().loafmark.source, store, now)).toEqual({ removed: 1 });
    expect(await sweepPhotos(app().loafmark.source, store, new Date(now.getTime() + HOUR + 60_000))).toEqual({ removed: 6 });
    expect(await store.open({ workshopId: world.workshopId, photoId: photo.id, uploadSha256: other.uploadSha256 }, 'thumb')).toBeUndefined();
    expect(await readdir(path.join(app().uploadsDir, world.workshopId))).toEqual([photo.id]);
    for (const size of ['thumb', 'display', 'original']) await world.owner.get(`/api/photos/${photo.id}/${size}`).expect(200);
  });

  it('leaves nothing of a draft that was dropped', async () => {
    const folder = await mkdtemp(path.join(tmpdir(), 'loafmark-store-'));
    const store = new LocalPhotoStore(folder);
    const draft = await store.draft({ workshopId: uuidv7(), photoId: uuidv7(), uploadSha256: 'a'.repeat(64) });
    await writeFile(draft.paths.display, 'half');
    await draft.drop();
    expect((await readdir(folder, { recursive: true, withFileTypes: true })).filter((entry) => entry.isFile())).toEqual([]);
    await rm(folder, { recursive: true });
  });

  it('takes no name but two ids', async () => {
    const store = new LocalPhotoStore(tmpdir());
    await expect(store.draft({ workshopId: '..', photoId: uuidv7(), uploadSha256: 'a'.repeat(64) })).rejects.toThrow(RangeError);
    await expect(store.open({ workshopId: uuidv7(), photoId: '../../etc', uploadSha256: 'a'.repeat(64) }, 'thumb')).rejects.toThrow(RangeError);
  });
});

describe('the stage that a photo proposes', () => {
  const cold = { method: 'cold', madeOn: '2026-03-02', unmouldedOn: '2026-03-03', cutOn: '2026-03-04', linoleicRich: true } as const;

  it.each([
    ['2026-03-01', undefined], ['2026-03-02', 'pour'], ['2026-03-03', 'unmould'], ['2026-03-04', 'cut'], ['2026-03-05', 'cut'], ['2026-03-08', 'cure-w1'],
    ['2026-03-16', 'cure-w2'], ['2026-03-31', 'cure-w4'], ['2026-04-14', 'cure-w6'], ['2026-03-23', undefined], ['2026-06-01', undefined],
  ])('is, on %s, %s', (day, stage) => {
    expect(proposedStage(cold, day)).toBe(stage);
  });

  it('is the cut where mould and knife came on one day', () => {
    expect(proposedStage({ ...cold, cutOn: '2026-03-03' }, '2026-03-03')).toBe('cut');
  });
});

describe('what a camera says', () => {
  const exifOf = async (tags: Record<string, string>, camera: Record<string, string> = {}) => (await sharp(await sharp(await aJpeg()).withExif({ IFD0: camera, IFD2: tags }).toBuffer()).metadata()).exif;

  it('is taken where it makes sense and left where it does not', async () => {
    expect(await takenWith(undefined)).toEqual({ localTime: null, offsetMinutes: null, camera: null });
    expect(await takenWith(Buffer.from('Exif\0\0not a block at all'))).toEqual({ localTime: null, offsetMinutes: null, camera: null });
    expect(await takenWith(await exifOf({ DateTimeOriginal: '0000:00:00 00:00:00' }))).toMatchObject({ localTime: null });
    expect(await takenWith(await exifOf({ DateTimeOriginal: '2026:02:31 10:00:00' }))).toMatchObject({ localTime: null });
    expect(await takenWith(await exifOf({ DateTimeOriginal: '2026:03:03 10:00:00', OffsetTimeOriginal: '-03:30' }, { Make: 'Halvorsen', Model: 'P5' })))
      .toEqual({ localTime: '2026-03-03T10:00:00', offsetMinutes: -210, camera: 'Halvorsen P5' });
    expect((await takenWith(await exifOf({}, { Make: 'X', Model: 'y'.repeat(500) }))).camera).toHaveLength(80);
  });

  it('is turned into an instant on the workshop’s clock, also around the change of the clocks', () => {
    expect(instantIn('Europe/London', '2026-07-01T12:00:00').toISOString()).toBe('2026-07-01T11:00:00.000Z');
    expect(instantIn('Europe/London', '2026-03-29T00:30:00').toISOString()).toBe('2026-03-29T00:30:00.000Z');
    expect(instantIn('Europe/London', '2026-03-29T02:30:00').toISOString()).toBe('2026-03-29T01:30:00.000Z');
    expect(instantIn('America/New_York', '2026-11-01T03:00:00').toISOString()).toBe('2026-11-01T08:00:00.000Z');
    expect(instantIn('Asia/Kolkata', '2026-01-01T00:00:00').toISOString()).toBe('2025-12-31T18:30:00.000Z');
  });
});
