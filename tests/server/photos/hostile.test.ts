import { execFileSync } from 'node:child_process';
import { readdirSync } from 'node:fs';
import { request as plainRequest } from 'node:http';
import path from 'node:path';
import { deflateSync } from 'node:zlib';
import sharp from 'sharp';
import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aJpeg, aPngHead, upload, withJpegSize, type FileToSend } from '#tests/support/pictures.ts';
import { aWorkshop, type Person } from '#tests/support/world.ts';

const app = appForFile();
const filesIn = (folder: string) => readdirSync(folder, { recursive: true, withFileTypes: true }).filter((entry) => entry.isFile()).map((entry) => path.join(entry.parentPath, entry.name));
const left = () => filesIn(app().uploadsDir);

/** A form written by hand, for what no browser would send. */
function rawForm(person: Person, parts: string, head = 'multipart/form-data; boundary=b0und') {
  return person.raw('post', '/api/photos').set('Content-Type', head).send(parts);
}
const part = (disposition: string, body: string) => `--b0und\r\nContent-Disposition: form-data; ${disposition}\r\n\r\n${body}\r\n`;

describe('what is not a photo', () => {
  const jpeg = aJpeg();
  const svg = '<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>';
  const cases: [string, () => Promise<Buffer>, RegExp][] = [
    ['an SVG with a script', async () => Buffer.from(svg), /not a picture that can be read|of kind XML/],
    ['an SVG with an XML head', async () => Buffer.from(`<?xml version="1.0"?>${svg}`), /of kind XML, not a photo; send a JPEG, PNG or WebP/],
    ['a page', async () => Buffer.from('<!doctype html><script>alert(1)</script>'), /not a picture that can be read/],
    ['a PDF', async () => Buffer.from('%PDF-1.7\n1 0 obj\n'), /of kind PDF/],
    ['a GIF', async () => sharp({ create: { width: 8, height: 8, channels: 3, background: '#fff' } }).gif().toBuffer(), /of kind GIF/],
    ['a TIFF', async () => sharp({ create: { width: 8, height: 8, channels: 3, background: '#fff' } }).tiff().toBuffer(), /of kind TIF/],
    ['an AVIF', async () => sharp({ create: { width: 8, height: 8, channels: 3, background: '#fff' } }).avif().toBuffer(), /of kind AVIF/],
    ['a ZIP', async () => Buffer.concat([Buffer.from('PK\u0003\u0004'), Buffer.alloc(64)]), /of kind ZIP/],
    ['an HEIC from a phone', async () => Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from('ftypheic'), Buffer.alloc(64)]), /HEIC pictures cannot be read here\. Send it as JPEG/],
    ['nothing', async () => Buffer.alloc(0), /is empty/],
    ['a program', async () => Buffer.from('#!/bin/sh\nrm -rf /\n'), /not a picture/],
    ['a JPEG cut off half-way', async () => (await jpeg).subarray(0, Math.floor((await jpeg).length / 2)), /damaged or did not arrive whole/],
    ['a JPEG with its middle overwritten', async () => { const bytes = Buffer.from(await aJpeg(400, 400)); bytes.fill(0xff, 900, 2500); return bytes; }, /damaged/],
    ['only the head of a JPEG', async () => (await jpeg).subarray(0, 3), /damaged|not a picture/],
    ['a PNG that promises 30000 × 30000', async () => aPngHead(30_000, 30_000), /30000 × 30000 pixels; at most 60 million/],
    ['a JPEG that promises 65500 × 65500', async () => withJpegSize(await jpeg, 65_500, 65_500), /65500 × 65500 pixels/],
    ['a PNG that promises a little less than too much', async () => aPngHead(7_700, 7_700), /damaged/],
    ['a PNG with 200 MB of text in 200 kB', async () => aPngHead(64, 64, [{ type: 'zTXt', data: Buffer.concat([Buffer.from('Comment\0\0', 'latin1'), deflateSync(Buffer.alloc(200 * 1024 * 1024))]) }]), /damaged/],
  ];

  it.each(cases)('refuses %s with its reason, and keeps nothing of it', async (_what, make, reason) => {
    const world = await aWorkshop(app());
    const started = Date.now();
    const { body } = await upload(world.owner, [{ bytes: await make(), name: 'photo.jpg' }], { ids: uuidv7() }).expect(200);
    expect(body.items).toEqual([{ outcome: 'refused', fileName: 'photo.jpg', reason: expect.stringMatching(reason) }]);
    expect(Date.now() - started).toBeLessThan(20_000);
    expect(left().filter((file) => file.includes(world.workshopId))).toEqual([]);
    expect(await world.sql('select 1 from photo')).toEqual([]);
  });

  it('refuses what is heavier than 25 MiB, and takes what is a little lighter', async () => {
    const world = await aWorkshop(app());
    const heavy = Buffer.concat([await jpeg, Buffer.alloc(25 * 1024 * 1024)]);
    const { body } = await upload(world.owner, [{ bytes: heavy }]).expect(413);
    expect(body).toMatchObject({ type: '/problems/too-large', detail: 'A photo may weigh at most 25 MiB' });
    await upload(world.owner, [{ bytes: heavy.subarray(0, 25 * 1024 * 1024) }], { ids: uuidv7() }).expect(200).expect(({ body: fits }) => expect(fits.items[0].outcome).toBe('kept'));
    const many: FileToSend[] = Array.from({ length: 21 }, () => ({ bytes: Buffer.from('x') }));
    await upload(world.owner, many).expect(({ status }) => expect([413, 422]).toContain(status));
  });
});

describe('a form that is not what it should be', () => {
  const names = ['a[4294967294]', 'a[b][c][d][e]', 'a'.repeat(101), '__proto__[polluted]', 'photos[0]', 'constructor[prototype][x]', ''];
  it.each(names)('answers the field name "%s" with a refusal', async (name) => {
    const world = await aWorkshop(app());
    const { status, body } = await rawForm(world.owner, `${part(`name="${name}"`, 'x')}--b0und--\r\n`);
    expect([400, 422]).toContain(status);
    expect(body.type).toMatch(/^\/problems\/(?:malformed|invalid)$/);
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
  });

  it('answers __proto__ as a field with a refusal and pollutes nothing', async () => {
    const world = await aWorkshop(app());
    for (const name of ['__proto__', 'constructor', 'toString']) {
      const { status } = await rawForm(world.owner, `${part(`name="${name}"`, 'x')}--b0und--\r\n`);
      expect([400, 422], name).toContain(status);
    }
    expect(Object.prototype.hasOwnProperty.call({}, 'x')).toBe(false);
  });

  it('answers a broken form, another field, another type and no boundary, each with its problem', async () => {
    const world = await aWorkshop(app());
    const file = part('name="photos"; filename="a.jpg"', 'bytes');
    for (const [what, test] of [
      ['cut off', rawForm(world.owner, file)],
      ['wrong boundary', rawForm(world.owner, file, 'multipart/form-data; boundary=other')],
      ['no boundary', rawForm(world.owner, file, 'multipart/form-data')],
      ['file in another field', rawForm(world.owner, `${part('name="avatar"; filename="a.jpg"', 'x')}--b0und--\r\n`)],
      ['JSON', world.owner.post('/api/photos', { photos: [] })],
      ['a field of 70 kB', rawForm(world.owner, `${part('name="ids"', 'x'.repeat(70_000))}--b0und--\r\n`)],
      ['30 fields', rawForm(world.owner, `${Array.from({ length: 30 }, (_field, index) => part(`name="f${index}"`, 'x')).join('')}--b0und--\r\n`)],
    ] as const) {
      const { status, body } = await test;
      expect([400, 413, 415, 422], what).toContain(status);
      expect(body.type, what).toMatch(/^\/problems\//);
    }
  });

  it('leaves no bytes behind, whatever came in and however it broke off', async () => {
    const world = await aWorkshop(app());
    const url = new URL('/api/photos', app().url);
    await Promise.all(Array.from({ length: 5 }, () => new Promise<void>((resolve) => {
      const sending = plainRequest(url, { method: 'POST', headers: { Cookie: world.owner.cookie, 'Content-Type': 'multipart/form-data; boundary=b0und', 'Content-Length': '1000000' } });
      sending.on('error', () => resolve());
      sending.write(`${part('name="stage"', 'cut')}--b0und\r\nContent-Disposition: form-data; name="photos"; filename="a.jpg"\r\n\r\n${'x'.repeat(50_000)}`);
      setTimeout(() => sending.destroy(), 200);
    })));
    await expect.poll(() => left().filter((file) => file.includes('.incoming')), { timeout: 10_000 }).toEqual([]);
    expect(left().filter((file) => file.endsWith('.part'))).toEqual([]);
  });
});

describe('a decoder that dies', () => {
  it('costs the pictures it held and no others', async () => {
    const world = await aWorkshop(app());
    const big = await aJpeg(1800, 1400);
    await upload(world.owner, [{ bytes: await aJpeg() }], { ids: uuidv7() }).expect(200);
    const decoders = () => execFileSync('ps', ['-o', 'pid=,args=', '--ppid', String(process.pid)]).toString().split('\n').filter((line) => line.includes('decoder-process')).map((line) => Number.parseInt(line, 10));
    const sending = Promise.all(Array.from({ length: 6 }, () => upload(world.owner, [{ bytes: big }], { ids: uuidv7() }).expect(200)));
    await expect.poll(() => decoders().length, { timeout: 20_000, interval: 20 }).toBeGreaterThan(0);
    const [victim] = decoders();
    process.kill(victim ?? 0, 'SIGKILL');
    const outcomes = (await sending).map(({ body }) => body.items[0].outcome);
    expect(outcomes.filter((outcome) => outcome === 'refused').length).toBeLessThanOrEqual(1);
    // Killed while idle: the next picture starts another and never notices.
    for (const pid of decoders()) process.kill(pid, 'SIGKILL');
    await expect.poll(decoders, { timeout: 5_000 }).toEqual([]);
    await upload(world.owner, [{ bytes: await aJpeg() }], { ids: uuidv7() }).expect(200).expect(({ body }) => expect(body.items[0].outcome).toBe('kept'));
  }, 90_000);
});
