import { materialsApi } from '#shared/materials.ts';
import type { Api } from '#server/http/api.ts';
import { listMaterials, readMaterial } from './materials.read.ts';
import { addMaterial, changeMaterial } from './materials.service.ts';

export function materialsRoutes(api: Api): void {
  api.serve(materialsApi.list, ({ tx, query }) => listMaterials(tx, query));
  api.serve(materialsApi.read, ({ tx, params }) => readMaterial(tx, params.materialId));
  api.create(materialsApi.create, ({ tx, body }) => addMaterial(tx, body));
  api.serve(materialsApi.change, ({ tx, params, body, version }) => changeMaterial(tx, params.materialId, body, version));
}
