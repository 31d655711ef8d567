import express, { type Express } from 'express';
import { Pool } from 'pg';
import type { Logger } from 'pino';
import type { DataSource } from 'typeorm';
import type { Config } from './config.ts';
import { makeDataSource, refuseStrongRole } from './db/data-source.ts';
import { ENTITIES } from './entities.ts';
import { AnswerPool } from './features/causes/answer-pool.ts';
import { serveFeatures } from './features.ts';
import { Decoders } from './features/photos/decoders.ts';
import { keepSwept } from './features/photos/sweep.ts';
import { Api } from './http/api.ts';
import { serveClient } from './http/client-files.ts';
import { refuseCrossSite } from './http/cross-site.ts';
import { securityHeaders } from './http/headers.ts';
import { problemHandler } from './http/problems.ts';
import { Throttle } from './http/rate-limit.ts';
import { requestLog } from './http/request-log.ts';
import { sessions } from './http/session.ts';
import { notFound } from './problem.ts';
import { LocalPhotoStore } from './storage/local.ts';

/** Longest time one analysis statement may take, ms. */
const HEAVY_STATEMENT_MS = 30_000;
const HEAVY_POOL = 2;

export interface LoafmarkApp {
  express: Express;
  api: Api;
  source: DataSource;
  /** Clears away what a crash left in the photo store, now and every hour. */
  startSweeping(): void;
  /** From now on `ready` says no. */
  startStopping(): void;
  close(): Promise<void>;
}

/** Wires the whole server over its database; listens to nothing yet. */
export async function makeApp(config: Config, logger: Logger): Promise<LoafmarkApp> {
  const source = makeDataSource({ url: config.databaseUrl, poolSize: config.poolSize, entities: ENTITIES });
  const heavySource = makeDataSource({ url: config.databaseUrl, poolSize: HEAVY_POOL, statementMs: HEAVY_STATEMENT_MS, entities: ENTITIES });
  await Promise.all([source.initialize(), heavySource.initialize()]);
  await refuseStrongRole(source);
  // Sessions and the throttle keep their own small pool: signing in must work while the log is busy.
  const doorPool = new Pool({ connectionString: config.databaseUrl, max: 4, connectionTimeoutMillis: 2_000, application_name: 'loafmark-door' });
  doorPool.on('error', (error) => logger.warn({ err: error }, 'idle connection lost'));

  const sessionHandler = sessions(config, doorPool);
  const app = express();
  app.disable('x-powered-by');
  app.set('query parser', 'simple');
  app.set('trust proxy', config.trustedProxies);
  app.use(requestLog(logger));
  app.use(...securityHeaders(config.publicUrl));
  app.use('/api', refuseCrossSite(() => new URL(config.publicUrl).origin));
  app.use('/api', (request, response, next) => (request.path.startsWith('/health/') ? next() : sessionHandler(request, response, next)));
  app.use('/api', express.json({ limit: 256 * 1024, strict: true }));

  const answers = new AnswerPool();
  let stopping = false;
  let stopSweeping = () => {};
  const photoKit = { store: new LocalPhotoStore(config.uploadsDir), decoders: new Decoders() };
  const api = new Api(app, source, heavySource);
  serveFeatures(api, { app, config, source, doorPool, photoKit, logger, throttle: new Throttle(doorPool), answers, isStopping: () => stopping });
  app.use('/api', () => {
    throw notFound('route');
  });
  serveClient(app, config.clientDir);
  app.use(problemHandler);

  return {
    express: app,
    api,
    source,
    startSweeping: () => {
      stopSweeping = keepSwept(source, photoKit.store, logger);
    },
    startStopping: () => {
      stopping = true;
    },
    close: async () => {
      stopSweeping();
      await Promise.all([answers.close(), photoKit.decoders.close(), source.destroy(), heavySource.destroy(), doorPool.end()]);
    },
  };
}
