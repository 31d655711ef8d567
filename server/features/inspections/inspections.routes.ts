import { inspectionsApi } from '#shared/inspections.ts';
import type { Api } from '#server/http/api.ts';
import { listDue } from './due.read.ts';
import { changeFinding, keepFinding, withdrawFinding } from './findings.service.ts';
import { listInspections, readInspection } from './inspections.read.ts';
import { changeInspection, recordInspection } from './inspections.service.ts';
import { listLikelyFaults } from './likely.read.ts';

export function inspectionsRoutes(api: Api): void {
  api.serve(inspectionsApi.ofBatch, ({ tx, params }) => listInspections(tx, params.batchId));
  api.create(inspectionsApi.record, ({ tx, params, body }) => recordInspection(tx, params.batchId, body));
  api.serve(inspectionsApi.due, ({ tx, query }) => listDue(tx, query.on));
  api.serve(inspectionsApi.likely, ({ tx, query }) => listLikelyFaults(tx, query.stage, query.batchId));
  api.serve(inspectionsApi.read, ({ tx, params }) => readInspection(tx, params.inspectionId));
  api.serve(inspectionsApi.change, ({ tx, params, body, version }) => changeInspection(tx, params.inspectionId, body, version));
  api.create(inspectionsApi.keepFinding, ({ tx, params, body }) => keepFinding(tx, params.inspectionId, body));
  api.serve(inspectionsApi.changeFinding, ({ tx, params, body, version }) => changeFinding(tx, params.findingId, body, version));
  api.serve(inspectionsApi.withdrawFinding, ({ tx, params, body, version }) => withdrawFinding(tx, params.findingId, body.isWithdrawn, version));
}
