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
const AT_ONCE_MS = 50;
const END_MS = 2_000;

/** Taken apart from the pictures' own faults: the process died, or it took too long. */
export type Decoded = Rendered | Refusal | { why: 'broke-off' };

/**
 * Decodes pictures in processes of their own, at most two: one that crashes, swells or hangs costs its own
 * upload and nothing else.
 *
 * Each place has a pool of one process that is thrown away with it: a shared pool may hand the next picture
 * to the process that just died, and what it queued then waits for ever.
 */
export class Decoders {
  private readonly free: Pool[] = [];
  private readonly waiting: ((place: Pool) => void)[] = [];
  private readonly pools = new Set<Pool>();

  /** @throws Problem 503 when too many pictures wait already */
  async render(upload: string, into: Readonly<Record<PhotoSize, string>>): Promise<Decoded> {
    const started = performance.now();
    const decoded = await this.renderOnce(upload, into);
    // No picture kills a decoder that fast: it was dead before, and this picture had no part in it.
    return 'why' in decoded && decoded.why === 'broke-off' && performance.now() - started < AT_ONCE_MS ? this.renderOnce(upload, into) : decoded;
  }

  private async renderOnce(upload: string, into: Readonly<Record<PhotoSize, string>>): Promise<Decoded> {
    const pool = await this.place();
    try {
      const decoded = (await pool.exec('renderPicture', [upload, into]).timeout(LONGEST_MS)) as Rendered | Refusal;
      this.giveBack(pool);
      return decoded;
    } catch {
      this.pools.delete(pool);
      void end(pool);
      this.giveBack(this.fresh());
      return { why: 'broke-off' };
    }
  }

  async close(): Promise<void> {
    await Promise.all([...this.pools].map(end));
  }

  private async place(): Promise<Pool> {
    const idle = this.free.pop();
    if (idle) return idle;
    if (this.pools.size < MOST_PROCESSES) return this.fresh();
    if (this.waiting.length >= MOST_WAITING) throw busy('Many photos are being read just now', 5);
    return new Promise((resolve) => this.waiting.push(resolve));
  }

  private giveBack(pool: Pool): void {
    const next = this.waiting.shift();
    if (next) next(pool);
    else this.free.push(pool);
  }

  /** A place whose process starts with its first picture. */
  private fresh(): Pool {
    const loader = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
    const pool = workerpool.pool(fileURLToPath(new URL('decoder-process.ts', import.meta.url)), {
      workerType: 'process',
      maxWorkers: 1,
      forkOpts: {
        execArgv: ['--import', loader],
        env: { PATH: process.env['PATH'], VIPS_BLOCK_UNTRUSTED: '1', NODE_ENV: 'production' },
      },
    });
    this.pools.add(pool);
    return pool;
  }
}

/** A process that died while idle never says that it ended, so it is not waited for. */
async function end(pool: Pool): Promise<void> {
  await pool.terminate(true, END_MS).catch(() => undefined);
}
