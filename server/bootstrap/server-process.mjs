import { spawn } from 'node:child_process';
import path from 'node:path';
import { localSecret } from './cluster.mjs';
import { ROOT } from './places.mjs';
import { plainEnvironment, run } from './run.mjs';

/** The environment the server runs in; what is set from outside wins. */
export function serverEnvironment({ appUrl, port }) {
  return plainEnvironment({
    NODE_ENV: process.env.NODE_ENV === 'production' ? 'production' : 'development',
    SESSION_SECRET: process.env.SESSION_SECRET ?? localSecret('session'),
    UPLOADS_DIR: process.env.UPLOADS_DIR ?? path.join(ROOT, 'uploads'),
    CLIENT_DIR: path.join(ROOT, 'dist'),
    DATABASE_URL: appUrl,
    PORT: String(port),
  });
}

/** Runs one of the TypeScript scripts beside this file and gives its last line. */
export async function runScript(name, env) {
  const output = await run(process.execPath, ['--import', 'tsx', path.join(ROOT, 'server', 'bootstrap', name)], { cwd: ROOT, env });
  return output.trim().split('\n').at(-1);
}

/** Starts the server as a child of this process. */
export function startServer(env, { watch = false } = {}) {
  const args = ['--import', 'tsx', ...(watch ? ['--watch-path=server', '--watch-path=shared', '--watch-path=analysis', '--watch-preserve-output'] : []), path.join(ROOT, 'server', 'main.ts')];
  return spawn(process.execPath, args, { cwd: ROOT, env, stdio: ['ignore', 'inherit', 'inherit'] });
}

/** Waits until the server says that it is ready, or tells why it ended. */
export async function whenReady(url, child, seconds = 60) {
  let ended;
  child.once('exit', (code) => (ended = code ?? 1));
  const deadline = Date.now() + seconds * 1000;
  while (Date.now() < deadline) {
    if (ended !== undefined) throw new Error('The server ended before it was ready; its own words stand above.');
    const answer = await fetch(`${url}/api/health/ready`).catch(() => undefined);
    if (answer?.ok) return;
    await new Promise((resolve) => setTimeout(resolve, 150));
  }
  throw new Error(`The server was not ready within ${seconds} s.`);
}
