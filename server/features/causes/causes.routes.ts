import { causesApi } from '#shared/causes.ts';
import { lotBehaviourApi } from '#shared/lot-behaviour.ts';
import { methodComparisonApi } from '#shared/method-comparison.ts';
import type { Api } from '#server/http/api.ts';
import type { AnswerPool } from './answer-pool.ts';
import { readBatchesBehind, readBoard, readCause } from './causes.service.ts';
import { readLotBehaviour, readLotsBehaviour } from './lot-behaviour.service.ts';
import { readMethodComparison } from './method-comparison.service.ts';

/** All answers; `GET /api/lots/behaviour` must be served before `GET /api/lots/:lotId`. */
export function causesRoutes(api: Api, pool: AnswerPool): void {
  api.steps(causesApi.board, ({ work, query }) => readBoard(pool, work, query));
  api.steps(causesApi.batches, ({ work, params, query }) => readBatchesBehind(pool, work, { ...query, ...params }));
  api.steps(causesApi.one, ({ work, params, query }) => readCause(pool, work, { ...query, ...params }));
  api.steps(lotBehaviourApi.all, ({ work, query }) => readLotsBehaviour(pool, work, query.kind));
  api.steps(lotBehaviourApi.one, ({ work, params }) => readLotBehaviour(pool, work, params.lotId));
  api.steps(methodComparisonApi.compare, ({ work, query }) => readMethodComparison(pool, work, query));
}
