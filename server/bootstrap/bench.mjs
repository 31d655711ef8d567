import path from 'node:path';
import { installPackages } from './packages.mjs';
import { ROOT, makeLocal } from './places.mjs';
import { step } from './progress.mjs';
import { plainEnvironment, run } from './run.mjs';
import { end, endOnSignals, onEnd } from './shutdown.mjs';
import { throwAwayCluster } from './test-cluster.mjs';

endOnSignals();
try {
  console.log('\nLoafmark, benchmarks');
  makeLocal();
  await step('Packages', installPackages);
  let cluster;
  await step('PostgreSQL', async () => {
    cluster = await throwAwayCluster();
    onEnd(cluster.stop);
    return 'a throw-away cluster';
  });
  await run(process.execPath, ['--import', 'tsx', path.join(ROOT, 'tests', 'bench', 'run.ts'), ...process.argv.slice(2)], {
    cwd: ROOT, env: plainEnvironment({ TEST_DATABASE_URL: cluster.url }), show: true,
  });
  await end(0);
} catch (error) {
  console.error(`\n${error instanceof Error ? error.message : String(error)}\n`);
  await end(1);
}
