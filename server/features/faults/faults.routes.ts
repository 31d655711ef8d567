import { faultsApi } from '#shared/faults.ts';
import type { Api } from '#server/http/api.ts';
import { FAULT_VIEWS } from './faults.read.ts';

export function faultsRoutes(api: Api): void {
  api.serve(faultsApi.list, () => Promise.resolve({ items: [...FAULT_VIEWS] }));
}
