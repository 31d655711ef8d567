import type { OutboxMail } from '#shared/outbox.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';

/** The last hundred mails of this workshop, and those to the reader's own address. */
export async function listMails(tx: WorkshopTransaction): Promise<{ items: OutboxMail[] }> {
  const rows = await tx.rows<Omit<OutboxMail, 'createdAt'> & { createdAt: Date }>(
    `select id, recipient, subject, body, created_at "createdAt" from outbox_mail
     where workshop_id = $1 or (workshop_id is null and lower(recipient) = (select lower(email) from account where id = $2))
     order by created_at desc limit 100`,
    [tx.workshopId, tx.member.accountId],
  );
  return { items: rows.map((row) => ({ ...row, createdAt: row.createdAt.toISOString() })) };
}
