import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import sharp from 'sharp';
import workerpool from 'workerpool';
import { renderPicture } from './render.ts';

/** Longest one picture may take, ms. */
const LONGEST_MS = 10_000;
/** What a decoder may take beyond what it needs to stand ready, KiB: the largest picture allowed needs a third of it. */
const ROOM_KIB = 2 * 1024 * 1024;

/**
 * Pixel limits trust a file's header; this wall around the process does not. Where the system has no such
 * wall (it is Linux's), the header's word must do.
 */
function wallIn(): void {
  const size = /^VmSize:\s+(\d+) kB/m.exec(readFileSync('/proc/self/status', 'utf8'))?.[1];
  if (size) execFileSync('prlimit', ['--pid', String(process.pid), `--as=${(Number(size) + ROOM_KIB) * 1024}`]);
}

if (process.platform === 'linux') wallIn();

// Only the three kinds that are accepted can be loaded here, whatever the bytes pretend to be.
sharp.block({ operation: ['VipsForeignLoad'] });
sharp.unblock({ operation: ['VipsForeignLoadJpeg', 'VipsForeignLoadPng', 'VipsForeignLoadWebp'] });
// One picture at a time, then nothing of it stays.
sharp.cache(false);
sharp.concurrency(1);

workerpool.worker({
  renderPicture: async (...asked: Parameters<typeof renderPicture>) => {
    // Decoding runs beside this thread, so the alarm rings even while it hangs; the parent's own, longer limit is behind it.
    const alarm = setTimeout(() => process.exit(1), LONGEST_MS);
    try {
      return await renderPicture(...asked);
    } finally {
      clearTimeout(alarm);
    }
  },
});
