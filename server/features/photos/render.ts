import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { open } from 'node:fs/promises';
import { pipeline } from 'node:stream/promises';
import { fileTypeFromBuffer } from 'file-type';
import sharp, { type Metadata, type SharpOptions } from 'sharp';
import { PHOTO_LIMITS, type PhotoSize } from '#shared/photos.ts';
import { type TakenWith, takenWith } from './picture-facts.ts';

/** Long edge in pixels. */
export const EDGES = { display: 1600, thumb: 320 } as const;
const HEAD_BYTES = 4100;
const KINDS: Readonly<Record<string, string>> = { 'image/jpeg': 'jpeg', 'image/png': 'png', 'image/webp': 'webp' };
const HEIC = new Set(['image/heic', 'image/heif', 'image/heic-sequence', 'image/heif-sequence']);

/** Why a file is not kept; `kind` is what it is instead of a photo, e.g. `PDF`. */
export type Refusal = { why: 'empty' | 'heic' | 'not-readable' | 'damaged' } | { why: 'other-kind'; kind: string } | { why: 'too-many-pixels'; width: number; height: number };

export interface Rendered extends TakenWith {
  mediaType: 'image/jpeg' | 'image/png';
  width: number;
  height: number;
  bytes: number;
  storedSha256: string;
}

const LIMITS: SharpOptions = { limitInputPixels: PHOTO_LIMITS.pixels, failOn: 'warning', pages: 1, sequentialRead: true };

/**
 * Rewrites a picture upright in three sizes and reads when and with what it was taken.
 *
 * What is written holds pixels and, in the original, the colour profile: no other block of the upload survives,
 * and nothing that hung behind its end.
 *
 * @param upload path of the bytes as they came in; type and size are read from them, never from a name
 * @param into where each size is written
 */
export async function renderPicture(upload: string, into: Readonly<Record<PhotoSize, string>>): Promise<Rendered | Refusal> {
  const refusal = await refusalOf(upload);
  if (refusal) return refusal;
  try {
    const metadata = await sharp(upload, { ...LIMITS, limitInputPixels: false }).metadata();
    const { width = 0, height = 0 } = metadata;
    if (!Object.values(KINDS).includes(metadata.format ?? '')) return { why: 'not-readable' };
    if (width * height > PHOTO_LIMITS.pixels) return { why: 'too-many-pixels', width, height };
    return await writeSizes(upload, into, metadata);
  } catch {
    return { why: 'damaged' };
  }
}

/** Whether the bytes begin like a photo; told before any decoder sees them. */
async function refusalOf(upload: string): Promise<Refusal | undefined> {
  const file = await open(upload);
  try {
    const { buffer, bytesRead } = await file.read(Buffer.alloc(HEAD_BYTES), 0, HEAD_BYTES, 0);
    if (bytesRead === 0) return { why: 'empty' };
    const found = await fileTypeFromBuffer(buffer.subarray(0, bytesRead)).catch(() => undefined);
    if (!found) return { why: 'not-readable' };
    if (HEIC.has(found.mime)) return { why: 'heic' };
    return KINDS[found.mime] ? undefined : { why: 'other-kind', kind: found.ext.toUpperCase() };
  } finally {
    await file.close();
  }
}

async function writeSizes(upload: string, into: Readonly<Record<PhotoSize, string>>, metadata: Metadata): Promise<Rendered> {
  const staysPng = metadata.format === 'png';
  const upright = sharp(upload, LIMITS).autoOrient();
  // Four inks are for printers: browsers show them wrong, so they become screen colours.
  const original = metadata.space === 'cmyk' ? upright.withIccProfile('srgb') : upright.keepIccProfile();
  const { width, height, size } = await (staysPng ? original.png({ compressionLevel: 6 }) : original.jpeg({ quality: 95, chromaSubsampling: '4:4:4' })).toFile(into.original);
  await small(into.original, into.display, EDGES.display, 84);
  await small(into.display, into.thumb, EDGES.thumb, 78);
  return {
    mediaType: staysPng ? 'image/png' : 'image/jpeg',
    width,
    height,
    bytes: size,
    storedSha256: await sha256Of(into.original),
    ...(await takenWith(metadata.exif)),
  };
}

/** A JPEG that fits into a square of `edge`; what was see-through becomes white. */
async function small(from: string, to: string, edge: number, quality: number): Promise<void> {
  await sharp(from, { limitInputPixels: PHOTO_LIMITS.pixels })
    .flatten({ background: '#ffffff' })
    .resize({ width: edge, height: edge, fit: 'inside', withoutEnlargement: true })
    .jpeg({ quality, mozjpeg: true })
    .toFile(to);
}

/** SHA-256 of a file, as hex. */
export async function sha256Of(file: string): Promise<string> {
  const hash = createHash('sha256');
  await pipeline(createReadStream(file), hash);
  return hash.digest('hex');
}
