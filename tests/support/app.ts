import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import pino from 'pino';
import { afterAll, beforeAll } from 'vitest';
import { makeApp, type LoafmarkApp } from '#server/app.ts';
import { readConfig } from '#server/config.ts';
import { aDatabase, type TestDatabase } from './database.ts';

export interface RunningApp {
  loafmark: LoafmarkApp;
  database: TestDatabase;
  server: Server;
  url: string;
  uploadsDir: string;
}

/** Starts the real app over a database of its own and listens on a free loopback port. */
export async function startApp(environment: Record<string, string> = {}): Promise<RunningApp & { stop(): Promise<void> }> {
  const database = await aDatabase();
  const uploadsDir = await mkdtemp(path.join(tmpdir(), 'loafmark-uploads-'));
  const config = readConfig({
    NODE_ENV: 'test',
    DATABASE_URL: database.appUrl,
    SESSION_SECRET: 'a secret that only tests know, long enough',
    UPLOADS_DIR: uploadsDir,
    LOG_LEVEL: 'error',
    ...environment,
  });
  const loafmark = await makeApp(config, pino({ level: config.logLevel }));
  const server = createServer(loafmark.express);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  return {
    loafmark,
    database,
    server,
    url,
    uploadsDir,
    stop: async () => {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
      await loafmark.close();
      await database.drop();
      await rm(uploadsDir, { recursive: true, force: true });
    },
  };
}

/** The app for all tests of a file; use inside `describe` or at the top of the file. */
export function appForFile(environment: Record<string, string> = {}): () => RunningApp {
  let running: Awaited<ReturnType<typeof startApp>> | undefined;
  beforeAll(async () => {
    running = await startApp(environment);
  });
  afterAll(async () => {
    await running?.stop();
  });
  return () => {
    if (!running) throw new Error('The app is not running yet; call this inside a test');
    return running;
  };
}
