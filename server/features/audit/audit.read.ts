import type { z } from 'zod';
import type { auditApi, AuditEntry } from '#shared/audit.ts';
import { pageFrom, readCursor } from '#server/db/keyset.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';

type AuditFilter = z.output<NonNullable<typeof auditApi.list.query>>;
type AuditRow = Omit<AuditEntry, 'at'> & { at: Date };

/** A page of the trail, newest first. */
export async function listAuditEntries(tx: WorkshopTransaction, { cursor, limit, recordId, memberId, table }: AuditFilter) {
  const [lastId] = cursor ? readCursor(cursor, ['number']) : [null];
  const rows = await tx.rows<AuditRow>(
    `select e.id::text, e.at, m.name "memberName", e.deed, e.table_name "table", e.record_id "recordId", e.before, e.after
     from audit_entry e left join member m on m.workshop_id = e.workshop_id and m.id = e.member_id
     where ($1::uuid is null or e.record_id = $1) and ($2::uuid is null or e.member_id = $2) and ($3::text is null or e.table_name = $3) and ($4::bigint is null or e.id < $4::bigint)
     order by e.id desc limit $5`,
    [recordId ?? null, memberId ?? null, table ?? null, lastId, limit + 1],
  );
  const { items, next } = pageFrom(rows, limit, (row) => [Number(row.id)]);
  return { items: items.map((row) => ({ ...row, at: row.at.toISOString() })), next };
}
