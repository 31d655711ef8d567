import { Worker } from 'node:worker_threads';
import type { LoafPicture, LoafPictureSpec } from './spec.ts';
import type { Drawn } from './worker.ts';

export interface PoolOptions {
  /** Threads to draw with; as many as there are cores to spare. */
  workers: number;
  /** Called as each picture is ready, in the order they are finished; the next ones wait for it when it answers a promise. */
  onDone: (index: number, picture: LoafPicture) => void | Promise<void>;
}

/**
 * Draws many pictures on worker threads; each thread asks for the next one when its last was taken.
 *
 * @throws the first error of a thread or of `onDone`; no thread is left running
 */
export async function drawLoafPictures(specs: readonly LoafPictureSpec[], { workers, onDone }: PoolOptions): Promise<void> {
  let next = 0;
  const threads = Array.from({ length: Math.min(Math.max(1, workers), specs.length) }, () => new Worker(new URL('./thread.mjs', import.meta.url)));
  const run = async (thread: Worker): Promise<void> => {
    while (next < specs.length) {
      const index = next;
      next += 1;
      const { jpeg, ...rest } = await answerOf(thread, specs[index] as LoafPictureSpec);
      await onDone(index, { ...rest, jpeg: Buffer.from(jpeg.buffer, jpeg.byteOffset, jpeg.byteLength) });
    }
  };
  try {
    await Promise.all(threads.map(run));
  } finally {
    await Promise.all(threads.map((thread) => thread.terminate()));
  }
}

function answerOf(thread: Worker, spec: LoafPictureSpec): Promise<Drawn> {
  return new Promise((resolve, reject) => {
    const settle = () => {
      thread.off('message', taken);
      thread.off('error', failed);
      thread.off('exit', ended);
    };
    const taken = (answer: Drawn | { failed: string }) => {
      settle();
      if ('failed' in answer) reject(new Error(`picture of ${spec.batchCode}: ${answer.failed}`));
      else resolve(answer);
    };
    const failed = (error: Error) => { settle(); reject(error); };
    const ended = (code: number) => { settle(); reject(new Error(`picture thread ended with ${code}`)); };
    thread.on('message', taken);
    thread.on('error', failed);
    thread.on('exit', ended);
    thread.postMessage(spec);
  });
}
