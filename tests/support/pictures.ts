import { deflateSync, crc32 } from 'node:zlib';
import type { Test } from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import sharp from 'sharp';
import type { Person } from './world.ts';

export interface FileToSend {
  bytes: Buffer;
  name?: string;
  type?: string;
}

/** Sends files the way a browser does: fields first, then the files. */
export function upload(person: Person, files: FileToSend[], fields: Record<string, string> = {}): Test {
  let test = person.raw('post', '/api/photos');
  for (const [name, value] of Object.entries(fields)) test = test.field(name, value);
  for (const { bytes, name = 'loaf.jpg', type = 'image/jpeg' } of files) test = test.attach('photos', bytes, { filename: name, contentType: type });
  return test;
}

/** One good photo kept, and its view. */
export async function aPhoto(person: Person, fields: Record<string, string> = {}, bytes?: Buffer) {
  const { body } = await upload(person, [{ bytes: bytes ?? (await aJpeg()) }], { ids: uuidv7(), ...fields }).expect(200);
  return body.items[0].photo;
}

/** A JPEG with a soft gradient. */
export async function aJpeg(width = 120, height = 80): Promise<Buffer> {
  const pixels = Buffer.alloc(width * height * 3);
  for (let y = 0; y < height; y += 1) for (let x = 0; x < width; x += 1) pixels.set([(x * 255) / width, (y * 255) / height, 120], (y * width + x) * 3);
  return sharp(pixels, { raw: { width, height, channels: 3 } }).jpeg({ quality: 90 }).toBuffer();
}

function chunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const [length, sum] = [Buffer.alloc(4), Buffer.alloc(4)];
  length.writeUInt32BE(data.length);
  sum.writeUInt32BE(crc32(body));
  return Buffer.concat([length, body, sum]);
}

/** A PNG whose head promises any size, over a few bytes of pixels; with more chunks in front of them if wanted. */
export function aPngHead(width: number, height: number, extra: { type: string; data: Buffer }[] = []): Buffer {
  const head = Buffer.alloc(13);
  head.writeUInt32BE(width, 0);
  head.writeUInt32BE(height, 4);
  head.set([8, 2, 0, 0, 0], 8);
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]), chunk('IHDR', head), ...extra.map(({ type, data }) => chunk(type, data)),
    chunk('IDAT', deflateSync(Buffer.alloc(1000))), chunk('IEND', Buffer.alloc(0)),
  ]);
}

/** The JPEG with another size written into its frame head. */
export function withJpegSize(jpeg: Buffer, width: number, height: number): Buffer {
  const copy = Buffer.from(jpeg);
  for (let at = 2; at < copy.length; at += 2 + copy.readUInt16BE(at + 2)) {
    const marker = copy.readUInt16BE(at);
    if (marker >= 0xffc0 && marker <= 0xffc2) {
      copy.writeUInt16BE(height, at + 5);
      copy.writeUInt16BE(width, at + 7);
      return copy;
    }
  }
  throw new Error('the JPEG has no frame head');
}
