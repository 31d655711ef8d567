import { suppliersApi } from '#shared/suppliers.ts';
import type { Api } from '#server/http/api.ts';
import { listSuppliers, readSupplier } from './suppliers.read.ts';
import { addSupplier, changeSupplier } from './suppliers.service.ts';

export function suppliersRoutes(api: Api): void {
  api.serve(suppliersApi.list, ({ tx, query }) => listSuppliers(tx, query));
  api.serve(suppliersApi.read, ({ tx, params }) => readSupplier(tx, params.supplierId));
  api.create(suppliersApi.create, ({ tx, body }) => addSupplier(tx, body));
  api.serve(suppliersApi.change, ({ tx, params, body, version }) => changeSupplier(tx, params.supplierId, body, version));
}
