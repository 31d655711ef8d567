import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { ROOT } from './places.mjs';
import { plainEnvironment, run } from './run.mjs';

/** Installs what the lock file names, unless the stamp says that it is there. */
export async function installPackages() {
  const stamp = path.join(ROOT, 'node_modules', '.loafmark-stamp');
  const wanted = createHash('sha256').update(readFileSync(path.join(ROOT, 'package-lock.json'))).update(readFileSync(path.join(ROOT, 'package.json'))).update(process.version).digest('hex');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return 'there already';
  const npm = process.env.npm_execpath;
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund'];
  await (npm ? run(process.execPath, [npm, ...args], { cwd: ROOT, env: plainEnvironment() }) : run('npm', args, { cwd: ROOT, env: plainEnvironment() }));
  writeFileSync(stamp, wanted);
  return 'installed';
}
