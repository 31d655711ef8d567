import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { startCluster } from './cluster.mjs';

/** A cluster for one run of the tests, gone afterwards. */
export async function throwAwayCluster() {
  const folder = mkdtempSync(path.join(tmpdir(), 'loafmark-test-'));
  const cluster = await startCluster('test', { folder, isDurable: false, firstPort: 55300 });
  return {
    url: cluster.url,
    stop: async () => {
      await cluster.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
