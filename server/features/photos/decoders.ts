import { createRequire } from 'node:module';
import { fileURLToPath, pathToFileURL } from 'node:url';
import workerpool, { type Pool } from 'workerpool';
import type { PhotoSize } from '#shared/photos.ts';
import { busy } from '#server/problem.ts';
import type { Refusal, Rendered } from './render.ts';

const MOST_PROCESSES = 2;
const MOST_WAITING = 60;
/** Above the decoder's own limit for a picture, since a new decoder must start up first. */
const LONGEST_MS = 40_000;
/** Taken apart from the pictures' own faults: the process died, or it took too long. */
export type Decoded = Rendered | Refusal | { why: 'broke-off' };

/**
 * Decodes pictures in processes of their own, at most two: one that crashes, swells or hangs costs its own
 * upload and nothing else.
 */
export class Decoders {
  private readonly pool: Pool;

  constructor() {
    const loader = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
    const script = fileURLToPath(new URL('decoder-process.ts', import.meta.url));
    this.pool = workerpool.pool(script, {
      workerType: 'process',
      maxWorkers: MOST_PROCESSES,
      forkOpts: {
        execArgv: ['--import', loader],
        env: { PATH: process.env['PATH'], VIPS_BLOCK_UNTRUSTED: '1', NODE_ENV: 'production' },
      },
    });
  }

  /** @throws Problem 503 when too many pictures wait already */
  async render(upload: string, into: Readonly<Record<PhotoSize, string>>): Promise<Decoded> {
    if (this.pool.stats().pendingTasks >= MOST_WAITING) throw busy('Many photos are being read just now', 5);
    try {
      return (await this.pool.exec('renderPicture', [upload, into]).timeout(LONGEST_MS)) as Rendered | Refusal;
    } catch {
      return { why: 'broke-off' };
    }
  }

  /** How many decoders run. */
  get processes(): number {
    return this.pool.stats().totalWorkers;
  }

  async close(): Promise<void> {
    await this.pool.terminate(true);
  }
}
