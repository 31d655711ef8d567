import type { Express } from 'express';
import type { Pool } from 'pg';
import type { Logger } from 'pino';
import type { DataSource } from 'typeorm';
import type { Config } from './config.ts';
import { demoPassword } from './demo/password.ts';
import { auditRoutes } from './features/audit/audit.routes.ts';
import { batchesRoutes } from './features/batches/batches.routes.ts';
import type { AnswerPool } from './features/causes/answer-pool.ts';
import { causesRoutes } from './features/causes/causes.routes.ts';
import { claimsRoutes } from './features/claims/claims.routes.ts';
import { exportsRoutes } from './features/exports/exports.routes.ts';
import { faultsRoutes } from './features/faults/faults.routes.ts';
import { formulasRoutes } from './features/formulas/formulas.routes.ts';
import { healthRoutes } from './features/health/health.routes.ts';
import { importsRoutes } from './features/imports/imports.routes.ts';
import { inspectionsRoutes } from './features/inspections/inspections.routes.ts';
import { lotsRoutes } from './features/lots/lots.routes.ts';
import { materialsRoutes } from './features/materials/materials.routes.ts';
import { membersRoutes } from './features/members/members.routes.ts';
import { outboxRoutes } from './features/outbox/outbox.routes.ts';
import { makeToken, tokenHash } from './features/session/one-time-token.ts';
import { hashPassword, passwordFits, refuseWeakPassword } from './features/session/password.ts';
import type { PhotoKit } from './features/photos/photos.service.ts';
import { photosRoutes } from './features/photos/photos.routes.ts';
import { sessionRoutes } from './features/session/session.routes.ts';
import { suppliersRoutes } from './features/suppliers/suppliers.routes.ts';
import { workshopRoutes } from './features/workshop/workshop.routes.ts';
import type { Api } from './http/api.ts';
import { openApiDocument } from './http/openapi.ts';
import type { Throttle } from './http/rate-limit.ts';

export interface Surroundings {
  app: Express;
  config: Config;
  source: DataSource;
  doorPool: Pool;
  photoKit: PhotoKit;
  logger: Logger;
  throttle: Throttle;
  answers: AnswerPool;
  isStopping: () => boolean;
}

/** Every feature's routes, one line each. */
export function serveFeatures(api: Api, around: Surroundings): void {
  healthRoutes(api, { uploadsDir: around.config.uploadsDir, isStopping: around.isStopping });
  sessionRoutes(api, { throttle: around.throttle, config: around.config, demoPassword });
  membersRoutes(api, { config: around.config, throttle: around.throttle, door: { makeToken, tokenHash, hashPassword, passwordFits, refuseWeakPassword } });
  workshopRoutes(api);
  auditRoutes(api);
  outboxRoutes(api, around.config);
  suppliersRoutes(api);
  materialsRoutes(api);
  // Before the lots: `behaviour` is no lot's id.
  causesRoutes(api, around.answers);
  lotsRoutes(api);
  formulasRoutes(api);
  importsRoutes(api);
  batchesRoutes(api);
  exportsRoutes(api);
  claimsRoutes(api);
  faultsRoutes(api);
  inspectionsRoutes(api);
  photosRoutes(api, around.photoKit);
  around.app.get('/api/openapi.json', (_request, response) => {
    response.json(openApiDocument(api.served, around.config.publicUrl));
  });
}
