import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { ROOT } from './places.mjs';
import { plainEnvironment, run } from './run.mjs';

const SOURCES = ['src', 'shared', 'analysis', 'index.html', 'vite.config.ts', 'package-lock.json'];

function filesBelow(place) {
  const full = path.join(ROOT, place);
  if (!existsSync(full)) return [];
  if (!statSync(full).isDirectory()) return [full];
  return readdirSync(full, { withFileTypes: true, recursive: true }).filter((entry) => entry.isFile()).map((entry) => path.join(entry.parentPath, entry.name));
}

/** Builds the client unless what lies in `dist` was built from these very sources. */
export async function buildClient() {
  const stamp = path.join(ROOT, 'dist', '.built-from');
  const hash = createHash('sha256');
  for (const file of SOURCES.flatMap(filesBelow).sort()) hash.update(file).update(readFileSync(file));
  const wanted = hash.digest('hex');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return 'up to date';
  await run(process.execPath, [path.join(ROOT, 'node_modules', 'vite', 'bin', 'vite.js'), 'build', '--logLevel', 'warn'], { cwd: ROOT, env: plainEnvironment({ NODE_ENV: 'production' }) });
  writeFileSync(stamp, wanted);
  return 'built';
}
