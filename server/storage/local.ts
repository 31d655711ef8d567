import { randomUUID } from 'node:crypto';
import { mkdir, open, readdir, rename, rm, rmdir, stat } from 'node:fs/promises';
import path from 'node:path';
import { PHOTO_SIZES, type PhotoSize } from '#shared/photos.ts';
import { type PhotoStore, type PictureDraft, type PictureKey, type StoredPicture, uploadPrint } from './photo-store.ts';

const INCOMING = '.incoming';
const UUID = /^[\da-f]{8}(?:-[\da-f]{4}){3}-[\da-f]{12}$/;
/** `<print>-<size>`, or the same with a random tail while it is being written. */
const FILE = /^([\da-f]{24})-(?:thumb|display|original)(?:\.[\da-f-]{36}\.part)?$/;

/** Photos in a folder on this machine: `workshop/photo/print-size`. */
export class LocalPhotoStore implements PhotoStore {
  private readonly root: string;

  /** @param uploadsDir folder of the store; nothing else may serve it */
  constructor(uploadsDir: string) {
    this.root = path.resolve(uploadsDir);
  }

  async incomingFolder(): Promise<string> {
    const folder = path.join(this.root, INCOMING);
    await mkdir(folder, { recursive: true, mode: 0o700 });
    return folder;
  }

  async draft(key: PictureKey): Promise<PictureDraft> {
    const folder = this.folderOf(key);
    await mkdir(folder, { recursive: true, mode: 0o700 });
    const named = (size: PhotoSize) => path.join(folder, `${uploadPrint(key.uploadSha256)}-${size}`);
    const paths = Object.fromEntries(PHOTO_SIZES.map((size) => [size, `${named(size)}.${randomUUID()}.part`])) as Record<PhotoSize, string>;
    return {
      paths,
      keep: async () => {
        for (const size of PHOTO_SIZES) await flush(paths[size]);
        for (const size of PHOTO_SIZES) await rename(paths[size], named(size));
        // The names are durable only once their folders are.
        for (const each of [folder, path.dirname(folder), this.root]) await flush(each);
      },
      drop: async () => {
        for (const size of PHOTO_SIZES) await rm(paths[size], { force: true });
        await removeIfEmpty(folder);
      },
    };
  }

  async open(key: PictureKey, size: PhotoSize): Promise<StoredPicture | undefined> {
    const file = await open(path.join(this.folderOf(key), `${uploadPrint(key.uploadSha256)}-${size}`)).catch(unlessMissing);
    if (!file) return undefined;
    return { bytes: (await file.stat()).size, stream: file.createReadStream() };
  }

  async sweep(now: Date, olderThanMs: number, isKept: (workshopId: string, photoId: string, print: string) => Promise<boolean>): Promise<{ removed: number }> {
    const isOld = async (file: string) => {
      const facts = await stat(file).catch(unlessMissing);
      return facts !== undefined && now.getTime() - facts.mtimeMs >= olderThanMs;
    };
    let removed = 0;
    const remove = async (file: string) => {
      await rm(file, { force: true });
      removed += 1;
    };
    for (const name of await namesIn(path.join(this.root, INCOMING))) {
      const file = path.join(this.root, INCOMING, name);
      if (await isOld(file)) await remove(file);
    }
    for (const workshopId of (await namesIn(this.root)).filter((name) => UUID.test(name))) {
      for (const photoId of (await namesIn(path.join(this.root, workshopId))).filter((name) => UUID.test(name))) {
        const folder = path.join(this.root, workshopId, photoId);
        for (const name of await namesIn(folder)) {
          const match = FILE.exec(name);
          const file = path.join(folder, name);
          if (!match || !(await isOld(file))) continue;
          if (name.endsWith('.part') || !(await isKept(workshopId, photoId, match[1] ?? ''))) await remove(file);
        }
        if (await isOld(folder)) await removeIfEmpty(folder);
      }
    }
    return { removed };
  }

  private folderOf({ workshopId, photoId }: PictureKey): string {
    if (!UUID.test(workshopId) || !UUID.test(photoId)) throw new RangeError('A picture is named by two ids');
    return path.join(this.root, workshopId, photoId);
  }
}

/** Forces a file's bytes, or a folder's names, to disk. */
async function flush(target: string): Promise<void> {
  const handle = await open(target, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

async function namesIn(folder: string): Promise<string[]> {
  return (await readdir(folder).catch(unlessMissing)) ?? [];
}

async function removeIfEmpty(folder: string): Promise<void> {
  await rmdir(folder).catch(() => undefined);
}

function unlessMissing(error: NodeJS.ErrnoException): undefined {
  if (error.code === 'ENOENT') return undefined;
  throw error;
}
