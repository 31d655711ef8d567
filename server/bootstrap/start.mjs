import { prepare } from './prepare.mjs';
import { step } from './progress.mjs';
import { freePort, isFree } from './ports.mjs';
import { serverEnvironment, startServer, whenReady } from './server-process.mjs';
import { end, endOnSignals, onEnd, stopChild } from './shutdown.mjs';

const USUAL_PORT = 4800;

async function choosePort() {
  const wanted = Number(process.env.PORT ?? 0);
  if (!wanted) return freePort(USUAL_PORT);
  if (await isFree(wanted)) return wanted;
  throw new Error(`Port ${wanted} is in use. Stop what uses it, choose another with PORT=…, or leave PORT out for the next free one.`);
}

const DEMO_WORDS = `
  Demo accounts, all with the password grey-board-demo:
    owner      ilse@quernbyloft.example
    makers     tomasz@quernbyloft.example, priya@quernbyloft.example
    inspector  benedikt@quernbyloft.example
    viewer     clement@quernbyloft.example
  A second workshop, to try the wall between workshops: maren@saltmarshkettle.example`;

endOnSignals();
try {
  console.log('\nLoafmark');
  const port = await choosePort();
  const database = await prepare();
  const url = `http://127.0.0.1:${port}`;
  let server;
  await step('Server', async () => {
    server = startServer(serverEnvironment({ appUrl: database.appUrl, port }));
    onEnd(stopChild(server));
    await whenReady(url, server);
    return 'ready';
  });
  console.log(`\n  ${url}`);
  if (process.env.NODE_ENV !== 'production') console.log(DEMO_WORDS);
  console.log('\n  Ctrl-C stops everything.\n');
  server.once('exit', (code) => void end(code ?? 1));
} catch (error) {
  process.exitCode = 1;
  console.error(`\n${error instanceof Error ? error.message : String(error)}\n`);
  await end(1);
}
