import { workshopApi } from '#shared/workshop.ts';
import type { Api } from '#server/http/api.ts';
import { changeWorkshop, readWorkshop } from './workshop.service.ts';

export function workshopRoutes(api: Api): void {
  api.serve(workshopApi.read, ({ tx }) => readWorkshop(tx));
  api.serve(workshopApi.change, ({ tx, body, version }) => changeWorkshop(tx, body, version));
}
