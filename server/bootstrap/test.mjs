import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { testPrograms } from './browser.mjs';
import { buildClient } from './client-build.mjs';
import { installPackages } from './packages.mjs';
import { ROOT, makeLocal } from './places.mjs';
import { step } from './progress.mjs';
import { plainEnvironment, run } from './run.mjs';
import { end, endOnSignals, onEnd } from './shutdown.mjs';
import { throwAwayCluster } from './test-cluster.mjs';

const PROJECTS = ['unit', 'component', 'api', 'browser'];
/** `npm test -- api tests/server/lots` runs one project, and in it the files named. */
const [only, ...filters] = process.argv.slice(2);
if (only && !PROJECTS.includes(only)) {
  console.error(`Choose one of ${PROJECTS.join(', ')}, or nothing for all.`);
  process.exit(1);
}

const counts = { passed: 0, failed: 0 };
const node = (script, args, env) => run(process.execPath, [path.join(ROOT, script), ...args], { cwd: ROOT, env: plainEnvironment(env), show: true });

async function check(name, work) {
  console.log(`\n${name}`);
  try {
    await work();
    counts.passed += 1;
  } catch {
    counts.failed += 1;
  }
}

async function runProject(project, env) {
  const report = path.join(reports, `${project}.json`);
  console.log(`\nTests: ${project}`);
  const start = Date.now();
  const args = ['run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...filters];
  const broke = await node('node_modules/vitest/vitest.mjs', args, env).then(() => false, () => true);
  try {
    const { numPassedTests, numFailedTests, numFailedTestSuites, numTotalTests } = JSON.parse(readFileSync(report, 'utf8'));
    counts.passed += numPassedTests;
    // A file that could not even be loaded has no failed test of its own.
    counts.failed += numFailedTests || (broke ? Math.max(1, numFailedTestSuites) : 0);
    console.log(`${project}: ${numTotalTests} tests in ${((Date.now() - start) / 1000).toFixed(1)} s`);
  } catch {
    counts.failed += 1;
  }
}

endOnSignals();
const reports = mkdtempSync(path.join(tmpdir(), 'loafmark-reports-'));
onEnd(async () => rmSync(reports, { recursive: true, force: true }));
try {
  console.log('\nLoafmark, all tests');
  makeLocal();
  await step('Packages', installPackages);
  await step('Browser', testPrograms);
  let cluster;
  await step('PostgreSQL', async () => {
    cluster = await throwAwayCluster();
    onEnd(cluster.stop);
    return 'a throw-away cluster';
  });
  if (!only) {
    await check('Lint', () => node('node_modules/eslint/bin/eslint.js', ['.', '--max-warnings', '0']));
    await check('Types', () => node('node_modules/typescript/bin/tsc', ['--noEmit']));
  }
  if (!only || only === 'browser') await step('Client', buildClient);
  for (const project of only ? [only] : PROJECTS) await runProject(project, { TEST_DATABASE_URL: cluster.url });
} catch (error) {
  counts.failed += 1;
  console.error(`\n${error instanceof Error ? error.message : String(error)}`);
}
console.log(`\n${counts.passed} passed, ${counts.failed} failed`);
await end(counts.failed > 0 || counts.passed === 0 ? 1 : 0);
