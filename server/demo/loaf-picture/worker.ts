import { parentPort } from 'node:worker_threads';
import { drawLoafPicture } from './draw.ts';
import type { LoafPicture, LoafPictureSpec } from './spec.ts';

/** A picture as it crosses the threads, where a Buffer arrives as plain bytes. */
export type Drawn = Omit<LoafPicture, 'jpeg'> & { jpeg: Uint8Array };

parentPort?.on('message', (spec: LoafPictureSpec) => {
  drawLoafPicture(spec).then(
    (picture) => parentPort?.postMessage(picture),
    (error: unknown) => parentPort?.postMessage({ failed: error instanceof Error ? error.message : String(error) }),
  );
});
