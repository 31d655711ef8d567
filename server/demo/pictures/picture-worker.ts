import { parentPort } from 'node:worker_threads';
import { drawPicture } from './draw-picture.ts';
import type { PictureWish } from './picture-wish.ts';

// Draws one wish after another for draw-pictures.ts.
parentPort?.on('message', ({ at, wish }: { at: number; wish: PictureWish }) => {
  void drawPicture(wish).then(
    (picture) => parentPort?.postMessage({ at, picture }),
    (error: unknown) => parentPort?.postMessage({ at, failure: error instanceof Error ? (error.stack ?? error.message) : String(error) }),
  );
});
