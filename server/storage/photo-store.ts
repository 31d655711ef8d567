import type { Readable } from 'node:stream';
import type { PhotoSize } from '#shared/photos.ts';

/** Where one picture lies. Made by the server alone; nothing of it comes from a file's name. */
export interface PictureKey {
  workshopId: string;
  photoId: string;
  /** SHA-256 of the upload, so that two uploads under one id never share a file. */
  uploadSha256: string;
}

/** A picture being written: fill the files named in `paths`, then keep or drop the whole. */
export interface PictureDraft {
  paths: Readonly<Record<PhotoSize, string>>;
  /** Makes all sizes durable under their names; they are on disk when it resolves. */
  keep(): Promise<void>;
  /** Removes what was written; harmless after `keep`. */
  drop(): Promise<void>;
}

export interface StoredPicture {
  bytes: number;
  stream: Readable;
}

export interface PhotoStore {
  /** A private file path for bytes on their way in. */
  incomingFolder(): Promise<string>;
  draft(key: PictureKey): Promise<PictureDraft>;
  /** The picture, or undefined when there is none. */
  open(key: PictureKey, size: PhotoSize): Promise<StoredPicture | undefined>;
  /**
   * Removes pictures that no row names and bytes that never became a picture.
   *
   * @param olderThanMs younger files are left: their row may be about to be written
   * @param isKept tells whether a row names the picture
   */
  sweep(now: Date, olderThanMs: number, isKept: (workshopId: string, photoId: string, uploadPrint: string) => Promise<boolean>): Promise<{ removed: number }>;
}

/** Part of the upload's SHA-256 that stands in the file's name. */
export function uploadPrint(uploadSha256: string): string {
  return uploadSha256.slice(0, 24);
}
