import { spawn } from 'node:child_process';
import path from 'node:path';
import { ROOT } from './places.mjs';
import { freePort } from './ports.mjs';
import { prepare } from './prepare.mjs';
import { plainEnvironment } from './run.mjs';
import { serverEnvironment, startServer } from './server-process.mjs';
import { end, endOnSignals, onEnd, stopChild } from './shutdown.mjs';

endOnSignals();
try {
  console.log('\nLoafmark, for development');
  const database = await prepare({ withClient: false });
  const apiPort = await freePort(4850);
  const server = startServer(serverEnvironment({ appUrl: database.appUrl, port: apiPort }), { watch: true });
  onEnd(stopChild(server));
  const vite = spawn(process.execPath, [path.join(ROOT, 'node_modules', 'vite', 'bin', 'vite.js')], {
    cwd: ROOT, stdio: 'inherit', env: plainEnvironment({ LOAFMARK_API: `http://127.0.0.1:${apiPort}` }),
  });
  onEnd(stopChild(vite));
  vite.once('exit', (code) => void end(code ?? 1));
} catch (error) {
  console.error(`\n${error instanceof Error ? error.message : String(error)}\n`);
  await end(1);
}
