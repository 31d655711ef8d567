import { readFileSync } from 'node:fs';
import exifr from 'exifr';
import sharp from 'sharp';
import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aFinding, aLook } from '#tests/support/looks.ts';
import { aJpeg, aPhoto, upload } from '#tests/support/pictures.ts';
import { aBatchRow } from '#tests/support/rows.ts';
import { aWorkshop, type Person } from '#tests/support/world.ts';
import { CORNERS, cornersOf, fourCorners } from './four-corners.ts';

const app = appForFile();
const fixture = (orientation: number) => readFileSync(new URL(`fixtures/orientation-${orientation}.jpg`, import.meta.url));
const picture = async (person: Person, photoId: string, size: string): Promise<Buffer> => (await person.get(`/api/photos/${photoId}/${size}`).buffer(true).expect(200)).body as Buffer;

describe('uploading photos', () => {
  it('keeps several at once and refuses the bad one among them with its reason', async () => {
    const world = await aWorkshop(app());
    const batchId = await aBatchRow(world);
    const ids = [uuidv7(), uuidv7(), uuidv7()];
    const files = [{ bytes: await aJpeg(), name: 'end.jpg' }, { bytes: Buffer.from('%PDF-1.7\n1 0 obj'), name: 'invoice.jpg' }, { bytes: await fourCorners(), name: 'top.png', type: 'image/png' }];
    const { body } = await upload(world.owner, files, { batchId, stage: 'cut', ids: ids.join(',') }).expect(200);
    expect(body.items.map(({ outcome, fileName }: Record<string, string>) => [fileName, outcome])).toEqual([['end.jpg', 'kept'], ['invoice.jpg', 'refused'], ['top.png', 'kept']]);
    expect(body.items[1].reason).toBe('This is a file of kind PDF, not a photo; send a JPEG, PNG or WebP picture');
    expect(body.items[0].photo).toMatchObject({ id: ids[0], batchId, stage: 'cut', width: 120, height: 80, uploadedByName: 'Test owner', takenAt: null, version: 1 });
    const { body: list } = await world.owner.get(`/api/photos?batchId=${batchId}`).expect(200);
    expect(list.items.map(({ id }: { id: string }) => id).sort()).toEqual([ids[0], ids[2]].sort());
  });

  it('gives the same photo to a repeat, and refuses another picture under its id', async () => {
    const world = await aWorkshop(app());
    const [ids, bytes] = [uuidv7(), await aJpeg()];
    const all = await Promise.all(Array.from({ length: 6 }, () => upload(world.owner, [{ bytes }], { ids }).expect(200)));
    expect(new Set(all.map(({ body }) => JSON.stringify(body))).size).toBe(1);
    const other = await upload(world.owner, [{ bytes: await aJpeg(60, 60) }], { ids }).expect(200);
    expect(other.body.items).toEqual([{ outcome: 'refused', fileName: 'loaf.jpg', reason: 'Another photo already has this id' }]);
    expect(await world.sql('select count(*)::int n from photo')).toEqual([{ n: 1 }]);
  });

  it('keeps exactly one of different pictures sent under one id at once, and its own bytes with it', async () => {
    const world = await aWorkshop(app());
    const ids = uuidv7();
    const pictures = await Promise.all([50, 60, 70, 80].map((width) => aJpeg(width, 40)));
    const all = await Promise.all(pictures.map((bytes) => upload(world.owner, [{ bytes }], { ids }).expect(200)));
    const kept = all.map(({ body }) => body.items[0]).filter(({ outcome }) => outcome === 'kept');
    expect(kept).toHaveLength(1);
    expect((await sharp(await picture(world.owner, ids, 'original')).metadata()).width).toBe(kept[0].photo.width);
  });

  it('names the field of a form that is wrong', async () => {
    const world = await aWorkshop(app());
    const bytes = await aJpeg();
    const pointers = async (fields: Record<string, string>, files = [{ bytes }]) => (await upload(world.owner, files, fields).expect(422)).body.errors.map(({ pointer }: { pointer: string }) => pointer);
    expect(await pointers({ ids: `${uuidv7()},${uuidv7()}` })).toEqual(['#/ids']);
    expect(await pointers({ ids: 'one' })).toEqual(['#/ids/0']);
    expect(await pointers({ stage: 'lunch' })).toEqual(['#/stage']);
    expect(await pointers({ batchId: uuidv7() })).toEqual(['#/batchId']);
    expect(await pointers({ colour: 'red' })).toEqual(['#/colour']);
    expect(await pointers({ stage: 'cut' }, [])).toEqual(['#/photos']);
    const there = await aWorkshop(app());
    expect(await pointers({ batchId: await aBatchRow(there) })).toEqual(['#/batchId']);
    expect(await world.sql('select count(*)::int n from photo')).toEqual([{ n: 0 }]);
  });
});

describe('what is kept of a picture', () => {
  // Tagged by exiftool, see fixtures/make.ts.
  it.each([1, 2, 3, 4, 5, 6, 7, 8])('is upright in every size, however the phone was held (EXIF orientation %i)', async (orientation) => {
    const world = await aWorkshop(app());
    const photo = await aPhoto(world.owner, {}, fixture(orientation));
    expect([photo.width, photo.height]).toEqual([96, 64]);
    for (const size of ['original', 'display', 'thumb']) {
      const bytes = await picture(world.owner, photo.id, size);
      expect((await sharp(bytes).metadata()).orientation).toBeUndefined();
      const corners = await cornersOf(bytes);
      for (const [corner, colour] of Object.entries(CORNERS)) {
        for (const [channel, value] of colour.entries()) expect(Math.abs((corners[corner as keyof typeof CORNERS][channel] ?? 0) - value), `${size} ${corner}`).toBeLessThan(12);
      }
    }
  });

  it('is the time with its offset and the camera as plain text; position, names and notes are gone', async () => {
    const world = await aWorkshop(app());
    const upright = fixture(1);
    expect(await exifr.gps(upright)).toMatchObject({ latitude: 51.501 });
    const photo = await aPhoto(world.owner, {}, upright);
    expect(photo).toMatchObject({ takenAt: '2026-03-03T20:41:05.000Z', camera: 'Corrie One <b>' });
    for (const size of ['original', 'display', 'thumb']) {
      const bytes = await picture(world.owner, photo.id, size);
      const { exif, xmp, iptc } = await sharp(bytes).metadata();
      expect([exif, xmp, iptc]).toEqual([undefined, undefined, undefined]);
      expect(await exifr.parse(bytes, true)).toBeUndefined();
      for (const secret of ['Exif', 'GPS', 'Somebody', 'Secret', 'private note']) expect(bytes.includes(secret), `${size}: ${secret}`).toBe(false);
    }
    const [row] = await world.sql('select * from photo where id = $1', [photo.id]);
    expect(JSON.stringify(row)).not.toMatch(/51\.5|0\.142|Secret|Somebody/);
  });

  it('takes a camera that names no offset to be on the workshop’s clock', async () => {
    const world = await aWorkshop(app());
    await world.sql(`update workshop set time_zone = 'America/New_York' where id = $1`, [world.workshopId]);
    const bytes = await sharp(await aJpeg()).withExif({ IFD2: { DateTimeOriginal: '2026:07:03 08:00:00' } }).toBuffer();
    expect((await aPhoto(world.owner, {}, bytes)).takenAt).toBe('2026-07-03T12:00:00.000Z');
  });

  it('carries nothing that hung behind the end of the picture', async () => {
    const world = await aWorkshop(app());
    const photo = await aPhoto(world.owner, {}, Buffer.concat([await aJpeg(), Buffer.from('PK\u0003\u0004<script>alert(1)</script>')]));
    for (const size of ['original', 'display', 'thumb']) expect((await picture(world.owner, photo.id, size)).includes('<script>')).toBe(false);
  });

  it('keeps the colour profile and the colours of a wide-gamut phone', async () => {
    const world = await aWorkshop(app());
    const sent = await sharp(await fourCorners()).withIccProfile('p3').jpeg({ quality: 100, chromaSubsampling: '4:4:4' }).toBuffer();
    const photo = await aPhoto(world.owner, {}, sent);
    const stored = await picture(world.owner, photo.id, 'original');
    const raw = (bytes: Buffer) => sharp(bytes, { ignoreIcc: true }).raw().toBuffer();
    const [before, after] = [await raw(sent), await raw(stored)];
    const worst = Math.max(...[...before].map((value, index) => Math.abs(value - (after[index] ?? 0))));
    expect((await sharp(stored).metadata()).icc?.equals((await sharp(sent).metadata()).icc ?? Buffer.alloc(0))).toBe(true);
    // A quarter's edge rings in JPEG; its middle must not move.
    expect(worst).toBeLessThan(16);
    const [sentMiddle, storedMiddle] = [await cornersOf(await sharp(sent, { ignoreIcc: true }).png().toBuffer()), await cornersOf(await sharp(stored, { ignoreIcc: true }).png().toBuffer())];
    expect(Object.values(storedMiddle).flat().every((value, index) => Math.abs(value - (Object.values(sentMiddle).flat()[index] ?? 0)) <= 1)).toBe(true);
  });

  it('comes in three sizes, none larger than the upload', async () => {
    const world = await aWorkshop(app());
    const photo = await aPhoto(world.owner, {}, await aJpeg(2400, 1200));
    const sizes = await Promise.all(['original', 'display', 'thumb'].map(async (size) => sharp(await picture(world.owner, photo.id, size)).metadata()));
    expect(sizes.map(({ width, height }) => [width, height])).toEqual([[2400, 1200], [1600, 800], [320, 160]]);
    const tiny = await aPhoto(world.owner, {}, await aJpeg(40, 30));
    expect((await sharp(await picture(world.owner, tiny.id, 'thumb')).metadata()).width).toBe(40);
  });

  it('goes by the bytes, not by the name: a PNG named .jpg stays a PNG, a WebP becomes a JPEG', async () => {
    const world = await aWorkshop(app());
    const png = await aPhoto(world.owner, {}, await fourCorners());
    const answer = await world.owner.get(`/api/photos/${png.id}/original`).expect(200);
    expect([answer.headers['content-type'], answer.headers['content-disposition']]).toEqual(['image/png', `inline; filename="${png.id}.png"`]);
    const webp = await aPhoto(world.owner, {}, await sharp(await fourCorners()).webp().toBuffer());
    expect((await sharp(await picture(world.owner, webp.id, 'original')).metadata()).format).toBe('jpeg');
  });
});

describe('handing pictures out', () => {
  it('sends fixed types under a policy that runs nothing, with a name of our own, and 304 to who has it', async () => {
    const world = await aWorkshop(app());
    const { body } = await upload(world.owner, [{ bytes: await aJpeg(), name: '../../"><script>\r\nX: 1.html' }], { ids: uuidv7() }).expect(200);
    const { photo } = body.items[0];
    expect(body.items[0].fileName).not.toMatch(/[\r\n]/);
    const answer = await world.owner.get(`/api/photos/${photo.id}/display`).expect(200);
    expect(answer.headers).toMatchObject({
      'content-type': 'image/jpeg', 'x-content-type-options': 'nosniff', 'content-disposition': `inline; filename="${photo.id}.jpg"`,
      'content-security-policy': `default-src 'none'; sandbox`, 'cross-origin-resource-policy': 'same-origin', vary: 'Cookie',
    });
    expect(answer.headers['cache-control']).toMatch(/^private, max-age=\d+$/);
    await world.owner.get(`/api/photos/${photo.id}/display`).set('If-None-Match', answer.headers['etag'] ?? '').expect(304);
    await world.owner.get(`/api/photos/${photo.id}/thumb`).set('If-None-Match', answer.headers['etag'] ?? '').expect(200);
    await world.owner.get(`/api/photos/${photo.id}/huge`).expect(422);
  });

  it('shows a photo to every role of its workshop and to nobody next door', async () => {
    const [world, there] = [await aWorkshop(app()), await aWorkshop(app())];
    const viewer = await world.member('viewer');
    const photo = await aPhoto(world.owner);
    for (const size of ['thumb', 'display', 'original']) {
      await viewer.get(`/api/photos/${photo.id}/${size}`).expect(200);
      await there.owner.get(`/api/photos/${photo.id}/${size}`).expect(404);
    }
    await there.owner.get(`/api/photos/${photo.id}`).expect(404);
    await there.owner.patch(`/api/photos/${photo.id}`, { alt: 'x' }, 1).expect(404);
    expect((await there.owner.get('/api/photos')).body.items).toEqual([]);
    await upload(viewer, [{ bytes: await aJpeg() }]).expect(403);
    await viewer.patch(`/api/photos/${photo.id}`, { alt: 'x' }, 1).expect(403);
  });

  it('leaves the store by no path', async () => {
    const world = await aWorkshop(app());
    const photo = await aPhoto(world.owner);
    for (const path of [`/api/photos/${photo.id}/..%2f..%2fpackage.json`, '/api/photos/%2e%2e/thumb', `/api/photos/${photo.id}%00/thumb`, `/uploads/${world.workshopId}/${photo.id}/`, '/api/photos/.incoming/thumb']) {
      const { status, text } = await world.owner.get(path);
      expect([status >= 400 || text.startsWith('<!'), path]).toEqual([true, path]);
    }
  });
});

describe('tying a photo to batch and stage', () => {
  it('proposes the stage from the day it was taken, until one is chosen', async () => {
    const world = await aWorkshop(app());
    const batchId = await aBatchRow(world, { made_on: '2026-03-02', unmoulded_on: '2026-03-03', cut_on: '2026-03-03' });
    const photo = await aPhoto(world.owner, {}, fixture(1));
    expect(photo).toMatchObject({ batchId: null, stage: null, proposedStage: null });
    expect((await world.owner.get('/api/photos')).body.items).toHaveLength(1);
    const tied = await world.owner.patch(`/api/photos/${photo.id}`, { batchId }, 1).expect(200);
    expect(tied.body).toMatchObject({ batchId, proposedStage: 'cut', version: 2 });
    const chosen = await world.owner.patch(`/api/photos/${photo.id}`, { stage: 'unmould', alt: 'The end of the loaf' }, 2).expect(200);
    expect(chosen.body).toMatchObject({ stage: 'unmould', proposedStage: null, alt: 'The end of the loaf' });
    await world.owner.patch(`/api/photos/${photo.id}`, { stage: 'cut' }, 2).expect(412);
    await world.owner.patch(`/api/photos/${photo.id}`, { batchId: uuidv7() }, 3).expect(422);
  });

  it('does not move a photo away from under the marks on it', async () => {
    const world = await aWorkshop(app());
    const [batchId, other] = [await aBatchRow(world), await aBatchRow(world)];
    const photo = await aPhoto(world.owner, { batchId });
    const marks = [{ id: uuidv7(), photoId: photo.id, shape: 'point', x: 0.5, y: 0.5 }];
    await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ findings: [aFinding({ marks })] })).expect(201);
    await world.owner.patch(`/api/photos/${photo.id}`, { batchId: other }, 1).expect(409);
    await world.owner.patch(`/api/photos/${photo.id}`, { batchId, stage: 'cut' }, 1).expect(200);
  });
});
