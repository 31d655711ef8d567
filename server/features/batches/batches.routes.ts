import { batchesApi } from '#shared/batches.ts';
import type { Api } from '#server/http/api.ts';
import { listMoulds, readBatch } from './batches.read.ts';
import { changeBatch, logBatch } from './batches.service.ts';
import { countBatches, listBatches } from './log.read.ts';
import { addMould } from './moulds.service.ts';

export function batchesRoutes(api: Api): void {
  api.serve(batchesApi.list, ({ tx, query }) => listBatches(tx, query));
  api.serve(batchesApi.count, ({ tx, query }) => countBatches(tx, query));
  api.serve(batchesApi.read, ({ tx, params }) => readBatch(tx, params.batchId));
  api.create(batchesApi.create, ({ tx, body }) => logBatch(tx, body));
  api.serve(batchesApi.change, ({ tx, params, body, version }) => changeBatch(tx, params.batchId, body, version));
  api.serve(batchesApi.moulds, ({ tx }) => listMoulds(tx));
  api.create(batchesApi.addMould, ({ tx, body }) => addMould(tx, body));
}
