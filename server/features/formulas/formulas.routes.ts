import { formulasApi } from '#shared/formulas.ts';
import type { Api } from '#server/http/api.ts';
import { listFormulas, readFormula } from './formulas.read.ts';
import { addFormula, changeFormula } from './formulas.service.ts';

export function formulasRoutes(api: Api): void {
  api.serve(formulasApi.list, ({ tx, query }) => listFormulas(tx, query));
  api.serve(formulasApi.read, ({ tx, params }) => readFormula(tx, params.formulaId));
  api.create(formulasApi.create, ({ tx, body }) => addFormula(tx, body));
  api.serve(formulasApi.change, ({ tx, params, body, version }) => changeFormula(tx, params.formulaId, body, version));
}
