import { mkdir } from 'node:fs/promises';
import { createServer } from 'node:http';
import pino from 'pino';
import { makeApp } from './app.ts';
import { readConfig } from './config.ts';

/** Longest time that running requests get to finish after a stop was asked for, ms. */
const GRACE_MS = 20_000;

const config = readConfig(process.env);
const logger = pino({ level: config.logLevel, base: null, timestamp: pino.stdTimeFunctions.isoTime });
await mkdir(config.uploadsDir, { recursive: true });
const loafmark = await makeApp(config, logger);
loafmark.startSweeping();
const server = createServer({ maxHeaderSize: 16 * 1024, connectionsCheckingInterval: 5_000 }, loafmark.express);
server.headersTimeout = 10_000;
server.requestTimeout = 120_000;
server.keepAliveTimeout = 65_000;
server.listen(config.port, config.host, () => {
  logger.info({ port: config.port }, 'listening');
});

let stopping = false;
async function stop(exitCode: number): Promise<void> {
  if (stopping) process.exit(exitCode || 1);
  stopping = true;
  loafmark.startStopping();
  logger.info('stopping');
  setTimeout(() => process.exit(1), GRACE_MS).unref();
  await new Promise<void>((resolve) => {
    server.close(() => resolve());
    server.closeIdleConnections();
  });
  await loafmark.close();
  process.exit(exitCode);
}

process.on('SIGTERM', () => void stop(0));
process.on('SIGINT', () => void stop(0));
process.on('unhandledRejection', (reason) => {
  logger.error({ err: reason }, 'unhandled rejection');
  void stop(1);
});
