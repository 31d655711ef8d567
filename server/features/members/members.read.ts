import type { MemberDetails } from '#shared/members.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';

type MemberRow = Omit<MemberDetails, 'createdAt' | 'updatedAt'> & { createdAt: Date; updatedAt: Date };

/** Members by name with their addresses; those who left come last. The contract drops the address where it is not for the reader. */
export async function listMembers(tx: WorkshopTransaction): Promise<{ items: MemberDetails[] }> {
  const rows = await tx.rows<MemberRow>(
    `select m.id, m.version, m.created_at "createdAt", m.updated_at "updatedAt", m.name, m.role, m.account_id is not null "hasAccount", m.ended_at is not null "hasEnded", a.email
     from member m left join account a on a.id = m.account_id where m.workshop_id = $1 order by m.ended_at is not null, m.name, m.id`,
    [tx.workshopId],
  );
  return { items: rows.map((row) => ({ ...row, createdAt: row.createdAt.toISOString(), updatedAt: row.updatedAt.toISOString() })) };
}
