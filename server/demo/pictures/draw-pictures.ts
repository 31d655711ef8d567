import { Worker } from 'node:worker_threads';
import type { Picture } from './draw-picture.ts';
import type { PictureWish } from './picture-wish.ts';

export interface DrawPictures {
  /** Threads to draw on; each keeps about 60 MB. */
  workers: number;
  /** Called for each picture as it is ready, in any order; the next wish of that thread waits for it. */
  onDone: (at: number, picture: Picture) => void | Promise<void>;
}

/** A thread does not always get its parent's TypeScript loader, so each starts its own. */
const startTypeScript = `
  const { workerData } = require('node:worker_threads');
  import('tsx/esm/api').then(({ tsImport }) => tsImport(workerData, workerData));
`;

type Answer = { at: number; picture: Picture } | { at: number; failure: string };

/**
 * Draws many pictures on several threads. Pictures are the same whatever the number of threads.
 *
 * @throws Error when a picture cannot be drawn or kept; the other threads are stopped
 */
export async function drawPictures(wishes: readonly PictureWish[], { workers, onDone }: DrawPictures): Promise<void> {
  let next = 0;
  const threads = Array.from({ length: Math.min(workers, wishes.length) }, () => new Worker(startTypeScript, { eval: true, workerData: new URL('picture-worker.ts', import.meta.url).href }));
  try {
    await Promise.all(threads.map((thread) => new Promise<void>((resolve, reject) => {
      const sendNext = () => {
        const at = next;
        next += 1;
        if (at >= wishes.length) resolve();
        else thread.postMessage({ at, wish: wishes[at] });
      };
      thread.on('error', reject);
      thread.on('exit', () => reject(new Error('a thread that draws pictures ended early')));
      thread.on('message', (answer: Answer) => {
        if ('failure' in answer) {
          reject(new Error(`the picture of ${wishes[answer.at]?.code ?? 'a batch'} could not be drawn: ${answer.failure}`));
          return;
        }
        // Over a thread's message a Buffer arrives as a plain byte array.
        const picture = { ...answer.picture, jpeg: Buffer.from(answer.picture.jpeg) };
        Promise.resolve(onDone(answer.at, picture)).then(sendNext, reject);
      });
      sendNext();
    })));
  } finally {
    await Promise.all(threads.map((thread) => thread.terminate()));
  }
}
