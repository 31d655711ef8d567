import { lotsApi } from '#shared/lots.ts';
import type { Api } from '#server/http/api.ts';
import { listLots, listStandingChanges, readLot } from './lots.read.ts';
import { addLot, changeLot, setLotStanding } from './lots.service.ts';

export function lotsRoutes(api: Api): void {
  api.serve(lotsApi.list, ({ tx, query }) => listLots(tx, query));
  api.serve(lotsApi.read, ({ tx, params }) => readLot(tx, params.lotId));
  api.create(lotsApi.create, ({ tx, body }) => addLot(tx, body));
  api.serve(lotsApi.change, ({ tx, params, body, version }) => changeLot(tx, params.lotId, body, version));
  api.serve(lotsApi.setStanding, ({ tx, params, body, version }) => setLotStanding(tx, params.lotId, body, version));
  api.serve(lotsApi.standingChanges, ({ tx, params }) => listStandingChanges(tx, params.lotId));
}
