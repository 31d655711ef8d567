import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { pageOf, pageQuery } from './http/page.ts';

/** One line of the trail: who did what to which record, before and after. */
export const AuditEntry = z.object({
  id: z.string(),
  at: z.string(),
  memberName: z.string().nullable(),
  deed: z.string(),
  table: z.string(),
  recordId: z.string().nullable(),
  before: z.record(z.string(), z.unknown()).nullable(),
  after: z.record(z.string(), z.unknown()).nullable(),
});
export type AuditEntry = z.infer<typeof AuditEntry>;

export const auditApi = {
  list: endpoint({
    method: 'get', path: '/api/audit', summary: 'The trail of changes, newest first', right: 'audit.read',
    query: z.object({ ...pageQuery, recordId: z.uuid().optional(), memberId: z.uuid().optional(), table: z.string().regex(/^[a-z_]{1,60}$/, 'Table must be a table’s name').optional() }),
    reply: pageOf(AuditEntry),
  }),
};
