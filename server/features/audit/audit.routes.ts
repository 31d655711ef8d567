import { auditApi } from '#shared/audit.ts';
import type { Api } from '#server/http/api.ts';
import { listAuditEntries } from './audit.read.ts';

export function auditRoutes(api: Api): void {
  api.serve(auditApi.list, ({ tx, query }) => listAuditEntries(tx, query));
}
